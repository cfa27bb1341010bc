/** The languages that the product speaks, on screen and in mail. */
export const locales = ['en', 'es'] as const;

export type Locale = (typeof locales)[number];
