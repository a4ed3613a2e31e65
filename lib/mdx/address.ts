/**
 * What is wrong with the address of a link, or null. Decided on what a browser would see: controls and white space are
 * dropped and \ counts as / before the scheme is read.
 */
export function addressFault(address: string): { message: string; better: string | null } | null {
  const seen = address
    .replace(/[\u0000-\u0020\u007f-\u00a0\u00ad\u200b-\u200f\u2028-\u202f\u2060-\u206f\ufeff]/g, "")
    .replaceAll("\\", "/");
  if (seen.startsWith("//")) {
    const better = address.startsWith("//") ? `https:${address}` : null;
    return {
      message: "An address that begins with // leads to another host unseen. Write https:// before it.",
      better,
    };
  }
  const scheme = /^([^:/?#]*):/.exec(seen)?.[1]?.toLowerCase();
  if (scheme === undefined || scheme === "https" || scheme === "mailto") return null;
  if (scheme === "http") {
    const better = address.startsWith("http://") ? `https:${address.slice(5)}` : null;
    return {
      message: "What an http:// address shows can be changed on its way. Write https:// if the page has it.",
      better,
    };
  }
  const message = `Addresses that begin with ${scheme.slice(0, 20)}: are not allowed. Write https://, mailto: or a page of this site.`;
  return { message, better: null };
}
