const LONGEST_LIST = 24;

/** A case's truth as indented JSON for a person to read; long lists are cut short and say so. */
export const truthText = (truth: unknown): string => JSON.stringify(truth, shortened, 2);

function shortened(_name: string, value: unknown): unknown {
  const list = ArrayBuffer.isView(value) && !(value instanceof DataView) ? Array.from(value as Float64Array) : value;
  if (!Array.isArray(list) || list.length <= LONGEST_LIST) return list;
  return [...list.slice(0, LONGEST_LIST), `and ${list.length - LONGEST_LIST} more`];
}
