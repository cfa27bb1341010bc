/** One field's error: a stable code, a reason in words, and where it stands (`rule.rrules.0`). */
export interface FieldError {
  readonly field: string;
  readonly reason: string;
  readonly message: string;
  readonly params?: Readonly<Record<string, string | number>>;
}

/** An RFC 9457 problem document, with a stable code and every field error at once. */
export interface ProblemDocument {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly code: string;
  readonly detail?: string;
  readonly requestId?: string;
  readonly errors?: readonly FieldError[];
}

/** What the domain throws; one handler turns it into a {@link ProblemDocument}. */
export class Problem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    readonly more: { detail?: string; errors?: readonly FieldError[] } = {},
  ) {
    super(`${code}: ${title}`);
  }
}

export const notFound = (what: string) =>
  new Problem(404, 'not-found', `This ${what} does not exist, or you may not see it.`);

export const forbidden = () => new Problem(403, 'forbidden', 'Your role does not allow this here.');

export const invalid = (errors: readonly FieldError[]) =>
  new Problem(422, 'invalid', 'Some of what was entered cannot be used.', { errors });

/** Somebody else saved a newer version; what was sent has not been applied. */
export const conflict = (detail?: string) =>
  new Problem(409, 'changed-meanwhile', 'Somebody else changed this meanwhile.', { detail });
