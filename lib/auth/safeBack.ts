import "server-only";

const ANY_ORIGIN = "https://own.invalid";

/** A path of our own to go back to, or null: an address that leads anywhere else is nobody's to give us. */
export function safeBack(path: unknown): string | null {
  // Browsers take a backslash for a slash and drop tabs and line ends before they look at an address.
  if (typeof path !== "string" || !path.startsWith("/") || /[\\\p{Cc}]/u.test(path)) return null;
  if (!URL.canParse(path, ANY_ORIGIN)) return null;
  const url = new URL(path, ANY_ORIGIN);
  // Dots that were taken out may leave two slashes in front, and those begin an address of another site.
  if (url.origin !== ANY_ORIGIN || url.pathname.startsWith("//")) return null;
  // Coming back to the sign-in page, or to an answer for machines, would lead nowhere.
  if (/^\/(sign-in|api)(\/|$)/.test(url.pathname)) return null;
  return url.pathname + url.search;
}
