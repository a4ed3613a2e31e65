import { createHash } from "node:crypto";

/** What stands before the first link. */
export const NO_LINK = "0".repeat(64);

/** SHA-256 over the previous link and the entry, both as 64 hexadecimal figures: changing any entry changes every later link. */
export const linkSha256 = (previousLinkHex: string, entryHex: string): string =>
  createHash("sha256")
    .update(previousLinkHex + entryHex, "utf8")
    .digest("hex");
