/** Value of a character is its place here: ISO/IEC 7064, MOD 37,36 (hybrid system, digits and letters). */
const CHARACTERS = "0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ";
const MODULUS = CHARACTERS.length;

/**
 * Check character of the ISO/IEC 7064 hybrid system MOD 37,36, to be put after the text.
 * @param text digits and capital letters, at least one
 * @throws RangeError when another character stands in the text
 */
export function checkCharacter(text: string): string {
  if (text.length === 0) throw new RangeError("checkCharacter: the text is empty");
  let product = MODULUS;
  for (const character of text) {
    const value = CHARACTERS.indexOf(character);
    if (value < 0) throw new RangeError(`checkCharacter: only 0-9 and A-Z, got ${JSON.stringify(character)}`);
    // The sum is reduced modulo 36 with 36 written for 0, doubled, and reduced modulo 37.
    product = (((product + value) % MODULUS || MODULUS) * 2) % (MODULUS + 1);
  }
  return CHARACTERS[(MODULUS + 1 - product) % MODULUS];
}
