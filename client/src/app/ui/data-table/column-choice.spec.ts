import { isShown, readColumnChoice, writeColumnChoice } from './column-choice';
import { ariaSort, nextSort } from './table-column';

class Shelf {
  readonly items = new Map<string, string>();
  getItem(name: string): string | null {
    return this.items.get(name) ?? null;
  }
  setItem(name: string, value: string): void {
    this.items.set(name, value);
  }
}

describe('column choice', () => {
  it('comes back as it was kept, per table', () => {
    const shelf = new Shelf();
    writeColumnChoice('stores', { city: false }, shelf);
    expect(readColumnChoice('stores', shelf)).toEqual({ city: false });
    expect(readColumnChoice('units', shelf)).toEqual({});
  });

  it('survives what others left in the storage', () => {
    expect(readColumnChoice('stores', { getItem: () => '[1,2' })).toEqual({});
    expect(readColumnChoice('stores', { getItem: () => '{"city":"no","zip":true}' })).toEqual({
      zip: true,
    });
    const refusing = {
      getItem: (): string => {
        throw new Error('refused');
      },
    };
    expect(readColumnChoice('stores', refusing)).toEqual({});
  });

  it('shows a fixed column always and an optional one by its default', () => {
    expect(isShown({ key: 'name', label: 'Name' }, { name: false })).toBe(true);
    expect(isShown({ key: 'zip', label: 'ZIP', choice: 'off' }, {})).toBe(false);
    expect(isShown({ key: 'zip', label: 'ZIP', choice: 'off' }, { zip: true })).toBe(true);
  });
});

describe('sort order', () => {
  it('rises first, then falls, then rises', () => {
    expect(nextSort('city', 'name')).toBe('name');
    expect(nextSort('name', 'name')).toBe('-name');
    expect(nextSort('-name', 'name')).toBe('name');
  });

  it('is said to screen readers', () => {
    expect(ariaSort('name', 'name')).toBe('ascending');
    expect(ariaSort('-name', 'name')).toBe('descending');
    expect(ariaSort('city', 'name')).toBe('none');
  });
});
