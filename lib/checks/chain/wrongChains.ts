import type { Amplifier, Arrester, Part, Site, Splitter } from "./site";

/** The same parts with every amplifier behind the arrester. */
export function amplifiersInRack(chain: readonly Part[]): Part[] {
  const entry = chain.findIndex(({ kind }) => kind === "arrester");
  const moved = chain.slice(0, entry).filter(({ kind }) => kind === "amplifier");
  const rest = chain.filter((part) => !moved.includes(part));
  const at = rest.findIndex(({ kind }) => kind === "arrester") + 1;
  return [...rest.slice(0, at), ...moved, ...rest.slice(at)];
}

/** The same chain with the amplifier of most gain at the antenna, and no other. */
export function mostGain(chain: readonly Part[], site: Site): Part[] {
  const amplifiers = site.parts.filter((part): part is Amplifier => part.kind === "amplifier");
  const strongest = amplifiers.reduce((a, b) => (b.gainDb > a.gainDb ? b : a));
  return [strongest, ...chain.filter(({ kind }) => kind !== "amplifier")];
}

/** The same chain with arrester and splitter of least loss, whatever they let through. */
export function leastLoss(chain: readonly Part[], site: Site): Part[] {
  const least = <T extends Arrester | Splitter>(parts: T[]) => parts.reduce((a, b) => (b.lossDb < a.lossDb ? b : a));
  return chain.map((part) =>
    part.kind === "arrester" || part.kind === "splitter"
      ? least(site.parts.filter((one): one is typeof part => one.kind === part.kind))
      : part,
  );
}
