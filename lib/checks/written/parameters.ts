/** A line of the account: what the technician writes about and what an assessor judges. */
export type WrittenLine = { id: string; label: string; critical: boolean };

export type WrittenParameters = { lines: readonly WrittenLine[] };

/** So many lines of so many characters fit in what is stored of one case. */
export const MOST_LINES = 8;
export const LONGEST_TEXT = 2000;
