const browsers: readonly (readonly [RegExp, string])[] = [
  // Those that also call themselves Chrome or Safari come first.
  [/\bEdgA?\/|\bEdgiOS\//, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung Internet'],
  [/\b(?:Firefox|FxiOS)\//, 'Firefox'],
  [/\b(?:Chrome|CriOS)\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];

const systems: readonly (readonly [RegExp, string])[] = [
  [/\biPad\b/, 'iPad'],
  [/\biPhone\b/, 'iPhone'],
  [/\bAndroid\b/, 'Android'],
  [/\bCrOS\b/, 'ChromeOS'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b/, 'macOS'],
  [/\bLinux\b/, 'Linux'],
];

/**
 * Browser and system in a few words that need no translation; an em dash when nothing is known.
 * @param userAgent RFC 9110 §10.1.5, as sent at sign-in
 *
 * @example deviceInWords('Mozilla/5.0 (X11; Linux x86_64; rv:130.0) Gecko/20100101 Firefox/130.0') // Firefox, Linux
 */
export function deviceInWords(userAgent: string | undefined): string {
  const named = (from: typeof browsers) =>
    from.find(([pattern]) => pattern.test(userAgent ?? ''))?.[1];
  return [named(browsers), named(systems)].filter(Boolean).join(', ') || '—';
}
