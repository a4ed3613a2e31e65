import { readCertificateNumber } from "./number";

/** True for a number in its written form only, not for one that would have to be folded first. */
export function isCertificateNumber(text: string): boolean {
  const reading = readCertificateNumber(text);
  return "number" in reading && reading.number === text;
}
