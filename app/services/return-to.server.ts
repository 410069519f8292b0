const nowhere = "http://nowhere.invalid";

/**
 * Where to go after signing in: a path of this site, whatever the address bar was made to say. Anything that a browser
 * could read as another site becomes the fallback.
 * @example returnTo("/songs?q=low", "/gigs") // "/songs?q=low"
 * @example returnTo("//elsewhere.example", "/gigs") // "/gigs"
 */
export function returnTo(wanted: FormDataEntryValue | null, fallback: string): string {
  if (typeof wanted !== "string" || !wanted.startsWith("/") || !URL.canParse(wanted, nowhere))
    return fallback;
  const url = new URL(wanted, nowhere);
  const path = url.pathname + url.search + url.hash;
  return url.origin === nowhere && !path.startsWith("//") ? path : fallback;
}
