import { boc, bpsk, MBOC, type Modulation } from "@/lib/gnss/spectra/modulation";

/** The modulation that a table writes as BPSK(1), BOC(10,5), BOCcos(15,2.5) or MBOC. */
export function modulationNamed(name: string): Modulation {
  if (name === "MBOC") return MBOC;
  const parts = /^(BPSK|BOC|BOCcos)\(([\d.]+)(?:,([\d.]+))?\)$/.exec(name);
  if (!parts) throw new RangeError(`modulationNamed: BPSK(n), BOC(m,n), BOCcos(m,n) or MBOC, got ${name}`);
  const [, kind, first, second] = parts;
  return kind === "BPSK" ? bpsk(Number(first)) : boc(Number(first), Number(second), kind === "BOC" ? "sine" : "cosine");
}
