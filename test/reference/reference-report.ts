/** What a reference check found; `failures` holds the ids of the cases that failed. */
export interface ReferenceReport {
  readonly cases: number;
  readonly failed: number;
  readonly failures: readonly string[];
  readonly occurrences?: number;
}
