/**
 * Where to go after signing in: the given address if it is a path of this application, else the
 * start. An address of another host, however disguised, never passes.
 *
 * @example safeReturnUrl('//evil.example') // '/'
 */
export function safeReturnUrl(given: string | null | undefined): string {
  if (!given || !given.startsWith('/')) return '/';
  // Browsers read a backslash as a slash and drop tabs and newlines inside an address.
  if (/^\/[/\\]/.test(given) || /[\\\t\r\n]/.test(given)) return '/';
  return given.startsWith('/sign-in') ? '/' : given;
}
