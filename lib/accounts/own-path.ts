/**
 * Where a sign-in leads when it was asked for by `next`: only ever a path of this site. Null for anything else, so that a link in a
 * mail cannot send somebody on to a stranger's page after they signed in here.
 */
export function ownPath(next: unknown): string | null {
  if (typeof next !== 'string' || next.length > 500 || !next.startsWith('/')) return null
  // Browsers read `//host` and `/\host` as another host, and drop tabs and line ends inside an address.
  if (/^\/[/\\]/.test(next) || /[\p{Cc}\\]/u.test(next)) return null
  const here = 'https://here.invalid'
  const url = URL.canParse(next, here) ? new URL(next, here) : null
  if (url === null || url.origin !== here || url.pathname.startsWith('//') || url.pathname.startsWith('/api/')) return null
  return `${url.pathname}${url.search}`
}
