/** A column of a {@link DataTable}. */
export interface TableColumn<Row> {
  readonly key: string;
  readonly label: string;
  /** The name by which the server sorts it; without one it cannot be sorted. */
  readonly sort?: string;
  /** Figures stand at the end, aligned by their digits. */
  readonly align?: 'start' | 'end';
  /** Can be hidden by the person; `off` is hidden until they show it. */
  readonly choice?: 'on' | 'off';
  /** The cell as plain text; give a `vwCell` template instead where it is more than text. */
  readonly text?: (row: Row) => string | number | null | undefined;
  /** On a phone: the head of the card, at its right, or (by default) a labelled line in it. */
  readonly phone?: 'title' | 'aside' | 'line' | 'none';
  /** CSS width on a wide screen. */
  readonly width?: string;
}

/** A sort order as the address and the server write it: `name`, or `-name` for falling. */
export type SortOrder = string;

/** The order after a press on the header of the column that sorts by `name`. */
export function nextSort(current: SortOrder, name: string): SortOrder {
  return current === name ? `-${name}` : name;
}

/** The value for `aria-sort` of that column. */
export function ariaSort(current: SortOrder, name: string): 'ascending' | 'descending' | 'none' {
  if (current === name) return 'ascending';
  return current === `-${name}` ? 'descending' : 'none';
}
