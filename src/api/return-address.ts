/** Where to go after signing in. Only an address of this product is followed, never another site's. */
export function returnAddress(next: string | null): string {
  if (next === null || !next.startsWith('/') || /^\/[/\\]/.test(next)) return '/';
  return next.startsWith('/sign-in') ? '/' : next;
}

/** The sign-in page's address that leads back to `here`. */
export function signInAddress(here: string): string {
  const target = returnAddress(here);
  return target === '/' ? '/sign-in' : `/sign-in?${new URLSearchParams({ next: target }).toString()}`;
}
