import { inject, Injectable, LOCALE_ID } from '@angular/core';
import { MatPaginatorIntl } from '@angular/material/paginator';

/** The paginator's words. */
@Injectable()
export class TablePages extends MatPaginatorIntl {
  private readonly format = new Intl.NumberFormat(inject(LOCALE_ID));

  override itemsPerPageLabel = $localize`:@@ui.table.per-page:Rows`;
  override nextPageLabel = $localize`:@@ui.table.next:Next page`;
  override previousPageLabel = $localize`:@@ui.table.previous:Previous page`;
  override firstPageLabel = $localize`:@@ui.table.first:First page`;
  override lastPageLabel = $localize`:@@ui.table.last:Last page`;

  override getRangeLabel = (page: number, pageSize: number, length: number): string => {
    const from = length === 0 ? 0 : page * pageSize + 1;
    const to = Math.min(length, (page + 1) * pageSize);
    const [first, last, all] = [from, to, length].map((value) => this.format.format(value));
    return $localize`:@@ui.table.range:${first}:from: – ${last}:to: of ${all}:all:`;
  };
}
