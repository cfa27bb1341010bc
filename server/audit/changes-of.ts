/** What a change did, field by field: `{ name: ['Old', 'New'] }`. Equal fields are left out. */
export function changesOf<T extends object>(
  before: T,
  after: T,
): Partial<Record<keyof T, readonly [unknown, unknown]>> {
  const changed: Partial<Record<keyof T, readonly [unknown, unknown]>> = {};
  for (const key of Object.keys(after) as (keyof T)[]) {
    if (JSON.stringify(before[key]) === JSON.stringify(after[key])) continue;
    changed[key] = [before[key] ?? null, after[key] ?? null];
  }
  return changed;
}
