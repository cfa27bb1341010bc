/** All texts of one kind of item, in lower case, with what each says. */
export interface Dictionary<T> {
  readonly pattern: RegExp;
  readonly values: ReadonlyMap<string, T>;
}

/** Writes every value there is, to look texts up among them. */
export function dictionary<T>(values: readonly T[], write: (value: T) => string): Dictionary<T> {
  return dictionaryOf(values.map((value) => [write(value).toLowerCase(), value]));
}

/** The same for texts that are written already. */
export function dictionaryOf<T>(entries: readonly (readonly [string, T])[]): Dictionary<T> {
  const texts = entries.map(([text]) => text).sort((a, b) => b.length - a.length);
  return { pattern: new RegExp(texts.map(escape).join('|'), 'y'), values: new Map(entries) };
}

/** A text that was understood up to `end`. */
export interface Reading<T> {
  readonly value: T;
  readonly end: number;
}

/**
 * Reads items joined by commas and, before the last, by `last`: every list that begins at `at`, the
 * longest first, as what looks like one more item may belong to the next clause ("at minute 0, 2
 * times").
 */
export function listsAt<T>(
  items: Dictionary<T>,
  last: string,
  text: string,
  at: number,
): Reading<T[]>[] {
  const lists: Reading<T[]>[] = [];
  const values: T[] = [];
  let next = itemAt(items, text, at);
  while (next) {
    values.push(next.value);
    const { end } = next;
    lists.unshift({ value: [...values], end });
    const joint = text.startsWith(', ', end) ? 2 : text.startsWith(last, end) ? last.length : 0;
    next = joint === 0 ? null : itemAt(items, text, end + joint);
  }
  return lists;
}

/** Reads the longest item that stands at `at`. */
export function itemAt<T>(
  { pattern, values }: Dictionary<T>,
  text: string,
  at: number,
): Reading<T> | null {
  const match = matchAt(pattern, text, at);
  const value = match && values.get(match[0]);
  return match && value !== undefined ? { value: value as T, end: at + match[0].length } : null;
}

/** Matches a sticky pattern at `at` only. */
export function matchAt(pattern: RegExp, text: string, at: number): RegExpExecArray | null {
  pattern.lastIndex = at;
  return pattern.exec(text);
}

/** Whole numbers from `from` to `to`, without 0 where the range reaches below it. */
export function range(from: number, to: number): number[] {
  const all = Array.from({ length: to - from + 1 }, (_, i) => from + i);
  return from < 0 ? all.filter((n) => n !== 0) : all;
}

/** Makes a text match itself in a pattern. */
export function escape(text: string): string {
  return text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
}
