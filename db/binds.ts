/** Collects the values of a statement; `add` gives back the placeholder to write in the SQL. */
export class Binds {
  readonly values: unknown[] = [];

  add(value: unknown): string {
    this.values.push(value);
    return `$${this.values.length}`;
  }
}
