/** What letters are about. */
export const letterKinds = ['invitation', 'password-reset', 'reminders', 'digest'] as const;

export type LetterKind = (typeof letterKinds)[number];

/** Queued: waits for its (next) attempt. Dead: refused for good until somebody asks to try again. */
export const letterStates = ['queued', 'sent', 'dead'] as const;

export type LetterState = (typeof letterStates)[number];

/** Kinds that carry a link which signs somebody in: shown to nobody but its reader. */
const secretKinds: ReadonlySet<string> = new Set<LetterKind>(['invitation', 'password-reset']);

export const carriesSecret = (kind: string): boolean => secretKinds.has(kind);
