import { ChangeDetectionStrategy, Component, signal } from '@angular/core';
import type { ComponentFixture } from '@angular/core/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { Cell } from './cell';
import { DataTable } from './data-table';
import type { TableColumn } from './table-column';

interface Store {
  readonly id: string;
  readonly name: string;
  readonly units: number;
}

@Component({
  imports: [Cell, DataTable],
  template: `
    <vw-data-table
      tableId="test"
      caption="Stores"
      [columns]="columns"
      [rows]="rows()"
      [rowId]="id"
      [rowLink]="link"
      [sort]="sort()"
      [long]="long()"
      [selectable]="true"
      [(selected)]="selected"
      (sortChange)="sort.set($event)"
    >
      <ng-template vwCell="units" [vwCellRows]="rows()" let-store
        >{{ store.units }} units</ng-template
      >
      <p empty>No stores yet</p>
    </vw-data-table>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class Host {
  readonly columns: readonly TableColumn<Store>[] = [
    { key: 'name', label: 'Store', sort: 'name', text: (store) => store.name },
    { key: 'units', label: 'Units', align: 'end', choice: 'on' },
  ];
  readonly rows = signal<readonly Store[]>([
    { id: 'a', name: 'Mill Pond', units: 3 },
    { id: 'b', name: 'Old Quarry', units: 5 },
  ]);
  readonly sort = signal('name');
  readonly long = signal(false);
  selected: ReadonlySet<string> = new Set();
  readonly id = (store: Store): string => store.id;
  readonly link = (store: Store): readonly unknown[] => ['/stores', store.id];
}

describe('DataTable', () => {
  let fixture: ComponentFixture<Host>;
  let element: HTMLElement;

  beforeEach(async () => {
    localStorage.clear();
    TestBed.configureTestingModule({ providers: [provideRouter([])] });
    fixture = TestBed.createComponent(Host);
    element = fixture.nativeElement as HTMLElement;
    await fixture.whenStable();
  });

  const texts = (selector: string): string[] =>
    [...element.querySelectorAll(selector)].map((found) => found.textContent?.trim() ?? '');

  it('shows texts and templates, the first cell leading to the row', () => {
    expect(texts('tbody td:last-child')).toEqual(['3 units', '5 units']);
    const links = [...element.querySelectorAll('a.row-link')];
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/stores/a', '/stores/b']);
    expect(texts('a.row-link')).toEqual(['Mill Pond', 'Old Quarry']);
  });

  it('asks for the falling order on a second press', async () => {
    expect(element.querySelector('th[aria-sort]')?.getAttribute('aria-sort')).toBe('ascending');
    element.querySelector<HTMLButtonElement>('button.sort')?.click();
    await fixture.whenStable();
    expect(fixture.componentInstance.sort()).toBe('-name');
    expect(element.querySelector('th[aria-sort]')?.getAttribute('aria-sort')).toBe('descending');
  });

  it('selects all and one', async () => {
    element.querySelector<HTMLInputElement>('thead input')?.click();
    await fixture.whenStable();
    expect([...fixture.componentInstance.selected]).toEqual(['a', 'b']);
    element.querySelector<HTMLInputElement>('tbody input')?.click();
    await fixture.whenStable();
    expect([...fixture.componentInstance.selected]).toEqual(['b']);
  });

  it('says what to do when there is nothing', async () => {
    expect(element.textContent).not.toContain('No stores yet');
    fixture.componentInstance.rows.set([]);
    await fixture.whenStable();
    expect(element.textContent).toContain('No stores yet');
  });

  it('draws only the rows in sight of a long list, and says how many there are', async () => {
    fixture.componentInstance.long.set(true);
    fixture.componentInstance.rows.set(
      Array.from({ length: 3000 }, (_, i) => ({ id: `s${i}`, name: `Store ${i}`, units: i })),
    );
    await fixture.whenStable();
    expect(element.querySelectorAll('tr.row').length).toBeLessThan(60);
    expect(element.querySelector('table')?.getAttribute('aria-rowcount')).toBe('3001');
  });

  it('goes from row to row by the arrow keys', () => {
    const [first, second] = [...element.querySelectorAll<HTMLElement>('a.row-link')];
    HTMLElement.prototype.scrollIntoView = jest.fn();
    first?.focus();
    first?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowDown', bubbles: true }));
    expect(document.activeElement).toBe(second);
  });
});
