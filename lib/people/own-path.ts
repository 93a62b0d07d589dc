/**
 * The path, with its query, that an address names on this site; `/` for anything that would lead elsewhere. What comes
 * out is relative, so that it holds for `localhost` and `127.0.0.1` alike.
 * @param own origins that count as this site
 */
export function ownPath(address: string | null | undefined, own: readonly string[] = []): string {
  if (!address) return '/';
  const base = 'http://this-site.invalid';
  try {
    const url = new URL(address, base);
    if (url.origin !== base && !own.includes(url.origin)) return '/';
    // A path may still begin with two slashes, which a browser would read as another host.
    const path = `/${url.pathname.replace(/^\/+/, '')}`;
    return `${path}${url.search}${url.hash}`;
  } catch {
    return '/';
  }
}
