/** A token of 32 bytes is 43 characters in base64url and 64 in hexadecimal; a UUID has 36. */
const tokenLike = /[A-Za-z0-9_-]{40,}/g;

/**
 * A letter's part with every token in it blotted out.
 *
 * @example withoutSecrets('…/invitation/3q2-7wAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAAA') // '…/invitation/•••'
 */
export const withoutSecrets = (part: string): string => part.replace(tokenLike, '•••');
