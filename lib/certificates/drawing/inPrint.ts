/** On paper C/N0 is written with its subscript. */
export const inPrint = (text: string): string => text.replaceAll("C/N0", "C/N\u2080");
