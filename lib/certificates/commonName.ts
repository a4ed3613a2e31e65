/** The common name of a distinguished name as Node writes it, one attribute a line. */
export const commonName = (distinguishedName: string): string =>
  /^CN=(.*)$/m.exec(distinguishedName)?.[1] ?? distinguishedName.replaceAll("\n", ", ");
