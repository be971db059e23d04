const HERE = "http://here.invalid";

/**
 * A path of this site to go on to after signing in, or "/" for anything else: other sites, addresses without a
 * host ("//…", "/\…"), the API and the sign-in page itself.
 */
export function safePath(wanted: string | string[] | null | undefined): string {
  if (typeof wanted !== "string" || !wanted.startsWith("/")) return "/";
  let url: URL;
  try {
    url = new URL(wanted, HERE);
  } catch {
    return "/";
  }
  const path = `${url.pathname}${url.search}`;
  const staysHere = url.origin === HERE && !path.startsWith("//");
  const isPage = !/^\/(api|sign-in|_next)(\/|$)/.test(url.pathname);
  return staysHere && isPage ? path : "/";
}
