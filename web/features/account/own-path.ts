/** Where to go after signing in: the `next` of the address if it leads within this program, else null. */
export function ownPath(next: string | null): string | null {
  if (next === null || !next.startsWith("/")) return null;
  const here = window.location.origin;
  // The browser's own reading settles what is another host: "//host", "/\host" and their kin.
  const target = URL.parse(next, here);
  if (target?.origin !== here || target.pathname.startsWith("/account/sign-in")) return null;
  return target.pathname + target.search + target.hash;
}
