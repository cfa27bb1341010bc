import type { SetFilter } from '../ui/filter-bar/filter-bar';
import type { FilterOption } from '../ui/filter-bar/filter-select';

interface Given {
  readonly key: string;
  /** As it stands in the address; empty for none. */
  readonly value: string;
  readonly options: readonly FilterOption[];
}

/** The filters now set, each by the word of its choice. A value that is no choice is left out. */
export function setFilters(given: readonly Given[]): readonly SetFilter[] {
  return given.flatMap(({ key, value, options }) => {
    const chosen = value === '' ? undefined : options.find((option) => option.value === value);
    return chosen ? [{ key, label: chosen.label }] : [];
  });
}
