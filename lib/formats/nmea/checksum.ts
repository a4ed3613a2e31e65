/**
 * Checksum of a sentence: exclusive or of the characters between `$` and `*`, both left out, as two hexadecimal digits.
 * IEC 61162-1 (NMEA 0183), from memory; tested against published sentences.
 */
export function nmeaChecksum(body: string): string {
  let sum = 0;
  for (let n = 0; n < body.length; n++) sum ^= body.charCodeAt(n);
  return (sum & 0xff).toString(16).toUpperCase().padStart(2, "0");
}
