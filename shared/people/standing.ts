export const standings = ['active', 'invited', 'deactivated'] as const;

/**
 * Active: can sign in. Invited: has chosen no password yet. Deactivated: let in no more, and kept
 * because of what they did.
 */
export type Standing = (typeof standings)[number];
