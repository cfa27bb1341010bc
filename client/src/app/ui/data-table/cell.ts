import { Directive, inject, input, TemplateRef } from '@angular/core';

export interface CellContext<Row> {
  readonly $implicit: Row;
}

/**
 * The template of a column's cells: `<ng-template vwCell="state" [vwCellRows]="rows()" let-task>`.
 * The rows are given only so that the compiler knows the type of the row.
 */
@Directive({ selector: 'ng-template[vwCell]' })
export class Cell<Row> {
  readonly vwCell = input.required<string>();
  readonly vwCellRows = input<readonly Row[]>();

  readonly template = inject<TemplateRef<CellContext<Row>>>(TemplateRef);

  static ngTemplateContextGuard<Row>(
    _cell: Cell<Row>,
    _context: unknown,
  ): _context is CellContext<Row> {
    return true;
  }
}
