/** A page of this site to go on to, from the address; `/` for anything that could lead elsewhere. */
export function ownPlace(to: string | null): string {
  if (to === null || !URL.canParse(to, window.location.origin)) return '/';
  const url = new URL(to, window.location.origin);
  // `//elsewhere` and `/\elsewhere` resolve to another origin
  if (!to.startsWith('/') || url.origin !== window.location.origin) return '/';
  return `${url.pathname}${url.search}${url.hash}`;
}
