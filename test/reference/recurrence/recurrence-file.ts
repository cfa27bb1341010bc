/** The four forms of reference files for recurrence; see the data's README. */
export interface RfcExamples {
  readonly examples: readonly RfcExample[];
  readonly dst_cases?: readonly WallTimeCase[];
  readonly dst_rule_sequences?: readonly ZonedSequence[];
}

/** Several rules of one example are equivalent, not added together. */
export interface RfcExample {
  readonly id: number | string;
  readonly title?: string;
  readonly section?: string;
  readonly dtstart: string;
  readonly tzid?: string | null;
  readonly rrules: readonly string[];
  readonly exdate?: readonly string[] | null;
  readonly rdate?: readonly string[] | null;
  readonly expected_local?: readonly string[] | null;
  readonly expected_utc?: readonly string[] | null;
  readonly complete: boolean;
}

export interface WallTimeCase {
  readonly id: string;
  readonly tzid: string;
  readonly local: string;
  readonly utc: string;
}

export interface ZonedSequence {
  readonly tzid: string;
  readonly dtstart: string;
  readonly rrule: string;
  readonly expected_utc: readonly string[];
}

export interface Vectors {
  readonly vectors: readonly Vector[];
}

/** A vector of any of the three kinds, told apart by what it expects. */
export interface Vector {
  readonly id: string;
  readonly dtstart: string;
  readonly rrule: string;
  readonly complete: boolean;
  readonly tzid?: string;
  readonly decided?: boolean;
  readonly occurrences?: readonly string[];
  readonly expected?: readonly string[] | null;
  readonly local?: readonly string[];
  readonly utc?: readonly string[];
  readonly gap?: readonly number[];
  readonly ambiguous?: readonly number[];
}

/** Whether the parsed file holds worked examples. */
export function holdsExamples(file: unknown): file is RfcExamples {
  return hasList(file, 'examples');
}

/** Whether the parsed file holds vectors. */
export function holdsVectors(file: unknown): file is Vectors {
  return hasList(file, 'vectors');
}

function hasList(file: unknown, key: string): boolean {
  return (
    typeof file === 'object' &&
    file !== null &&
    Array.isArray((file as Record<string, unknown>)[key])
  );
}
