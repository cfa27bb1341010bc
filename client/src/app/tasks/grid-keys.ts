/** Where the focus stands in a grid, both counted from 0. */
export interface GridPlace {
  readonly row: number;
  readonly column: number;
}

/**
 * Where a key leads in a grid, by the grid pattern of the ARIA Authoring Practices: arrows cell by
 * cell, Home and End within the row, with Control to the first and last cell of all, Page Up and
 * Page Down `jump` rows at once. Null for a key that moves nothing; the edges hold.
 *
 * @example gridMove({ row: 0, column: 0 }, { key: 'ArrowRight', ctrlKey: false }, 3, 35, 10)
 * // { row: 0, column: 1 }
 */
export function gridMove(
  from: GridPlace,
  event: Pick<KeyboardEvent, 'key' | 'ctrlKey'>,
  rows: number,
  columns: number,
  jump: number,
): GridPlace | null {
  const target = aim(from, event, rows, columns, jump);
  if (!target) return null;
  return {
    row: Math.min(rows - 1, Math.max(0, target.row)),
    column: Math.min(columns - 1, Math.max(0, target.column)),
  };
}

function aim(
  { row, column }: GridPlace,
  { key, ctrlKey }: Pick<KeyboardEvent, 'key' | 'ctrlKey'>,
  rows: number,
  columns: number,
  jump: number,
): GridPlace | null {
  switch (key) {
    case 'ArrowRight':
      return { row, column: column + 1 };
    case 'ArrowLeft':
      return { row, column: column - 1 };
    case 'ArrowDown':
      return { row: row + 1, column };
    case 'ArrowUp':
      return { row: row - 1, column };
    case 'PageDown':
      return { row: row + jump, column };
    case 'PageUp':
      return { row: row - jump, column };
    case 'Home':
      return { row: ctrlKey ? 0 : row, column: 0 };
    case 'End':
      return { row: ctrlKey ? rows - 1 : row, column: columns - 1 };
    default:
      return null;
  }
}
