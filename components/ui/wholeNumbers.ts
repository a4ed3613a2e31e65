/**
 * A text whose grouped numbers stay on one line: a word joiner follows the thin space between thousands, where a line
 * could break otherwise. (The fonts have no narrow no-break space.)
 */
export const wholeNumbers = (text: string): string => text.replace(/(\d\u2009)(?=\d)/g, "$1\u2060");
