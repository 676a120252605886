/**
 * Whether an address can be read as text: the percent signs of its path decode as UTF-8 (RFC 3986 section 2.5), and it
 * holds no NUL, which no text of the database may hold either.
 */
export function isReadableAddress({ pathname, search }: { pathname: string; search: string }): boolean {
  if (/%00/.test(pathname + search)) return false;
  try {
    decodeURIComponent(pathname);
    return true;
  } catch {
    return false;
  }
}
