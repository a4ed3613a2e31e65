import type { Part, Site } from "./site";

/** Why parts in this order are no chain for the site, in a sentence; null when they are one. */
export function orderFault(chain: readonly Part[], { needsSplitter }: Site): string | null {
  const count = (kind: Part["kind"]) => chain.filter((part) => part.kind === kind).length;
  const twice = chain.find((part, n) => chain.indexOf(part) < n);
  if (twice) return `${twice.id} is named twice; there is one of each.`;
  for (const [kind, name] of ONE_OF_EACH) {
    const wanted = kind === "splitter" && !needsSplitter ? 0 : 1;
    if (count(kind) < wanted) return `The chain has no ${name}.`;
    if (count(kind) > wanted)
      return wanted === 0 ? "This site needs no splitter." : `The chain has more than one ${name}.`;
  }
  const place = (kind: Part["kind"]) => chain.findIndex((part) => part.kind === kind);
  if (place("arrester") !== place("cable") + 1)
    return "The arrester stands at the entry, right behind the run of cable.";
  if (needsSplitter && place("splitter") < place("arrester"))
    return "The splitter stands in the building, behind the arrester.";
  return null;
}

const ONE_OF_EACH = [
  ["cable", "run of cable"],
  ["arrester", "arrester"],
  ["splitter", "splitter"],
] as const;
