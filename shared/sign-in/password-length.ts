/** Fewest and most characters of a password. Length is what counts; no composition rules. */
export const passwordLength = { min: 12, max: 128 } as const;
