/** The first sixteen figures in groups of four: "9C41 7E02 B8D5 30AF". */
export const shortFingerprint = (fingerprint: string): string =>
  (fingerprint.slice(0, 16).toUpperCase().match(/.{4}/g) ?? []).join(" ");
