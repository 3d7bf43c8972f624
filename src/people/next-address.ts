/**
 * Where to go after signing in: what `next` names, if that is one of our own pages.
 * @param origin ours
 */
export function nextAddress(next: string | null, origin: string): string {
  if (next === null || !URL.canParse(next, origin)) return '/'
  const address = new URL(next, origin)
  return address.origin === origin ? `${address.pathname}${address.search}${address.hash}` : '/'
}
