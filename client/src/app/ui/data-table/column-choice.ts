import type { TableColumn } from './table-column';

const key = (tableId: string): string => `vw.table.1.${tableId}`;

type Choice = Readonly<Record<string, boolean>>;

/**
 * Which columns of a table the person chose to see, remembered on this device. Only what differs
 * from the table's own default is kept, so a column added later appears by its default.
 */
export function readColumnChoice(tableId: string, storage: Pick<Storage, 'getItem'>): Choice {
  try {
    const parsed: unknown = JSON.parse(storage.getItem(key(tableId)) ?? '{}');
    if (typeof parsed !== 'object' || parsed === null || Array.isArray(parsed)) return {};
    return Object.fromEntries(
      Object.entries(parsed).filter((entry): entry is [string, boolean] => {
        return typeof entry[1] === 'boolean';
      }),
    );
  } catch {
    return {};
  }
}

/** Keeps the choice; refused storage makes it last as long as the page. */
export function writeColumnChoice(
  tableId: string,
  choice: Choice,
  storage: Pick<Storage, 'setItem'>,
): void {
  try {
    storage.setItem(key(tableId), JSON.stringify(choice));
  } catch {
    // Full or refused; nothing else depends on it.
  }
}

/** Whether a column is shown under a choice. */
export function isShown(column: TableColumn<never>, choice: Choice): boolean {
  if (column.choice === undefined) return true;
  return choice[column.key] ?? column.choice === 'on';
}
