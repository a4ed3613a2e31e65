/** Joins class names and leaves out what is false, null or empty. */
export const classNames = (...names: (string | false | null | undefined)[]): string => names.filter(Boolean).join(" ");
