/** Where to type the number: the address without its scheme and number, "lagmark.example/verify". */
export const verifyPlace = (verifyAddress: string): string =>
  verifyAddress.replace(/^https?:\/\//, "").replace(/\/[^/]*$/, "");
