import { entryValueNs, type EntrySign } from "@/lib/gnss/timing/delayBudget";
import type { Answers, PublicCase } from "../kind";
import { budgetOf, delayOfPart, runOfEchoesNs, type CountedPart } from "./budget";
import { NOTES } from "./notes";
import { readEcho } from "./readEcho";
import { wayOf, type SitePart } from "./site";

type Read = { leadNs: number; endNs: number };

/** One step of the work each, so that a wrong method is the right one with one step of its own. */
export type Steps = {
  read(data: PublicCase["data"]): Read;
  runNs(read: Read): number;
  counts(parts: readonly SitePart[]): readonly SitePart[];
  delayNs(part: SitePart, runNs: number): number;
  sign(note: string): EntrySign;
  uncertaintyNs(counted: readonly CountedPart[]): number;
};

const RIGHT: Steps = {
  read: readTraces,
  runNs: ({ leadNs, endNs }) => runOfEchoesNs(leadNs, endNs),
  counts: wayOf,
  delayNs: delayOfPart,
  sign: (note) => (NOTES["delay-is-positive"].includes(note) ? "delay-is-positive" : "delay-is-negative"),
  uncertaintyNs: (counted) => budgetOf(counted).uncertaintyNs,
};

/** The right method, from what the technician sees; `other` replaces single steps of it. */
export function solve({ data }: PublicCase, other: Partial<Steps> = {}): Answers {
  const steps = { ...RIGHT, ...other };
  const parts = data.parts as SitePart[];
  const read = steps.read(data);
  const counting = steps.counts(parts);
  const runNs = steps.runNs(read);
  const counted = counting.map((part) => ({ part, ns: Number(steps.delayNs(part, runNs).toFixed(1)) }));
  const totalNs = counted.reduce((sum, { ns }) => sum + ns, 0);
  const written = (part: SitePart) => counted.find((one) => one.part === part)?.ns.toFixed(1) ?? "0";
  return {
    "trace.lead": read.leadNs.toFixed(1),
    "trace.end": read.endNs.toFixed(1),
    ...Object.fromEntries(parts.map((part) => [`parts.${part.id}`, written(part)])),
    "entry.total": totalNs.toFixed(1),
    "entry.value": entryValueNs(totalNs, steps.sign(data.note as string)).toFixed(1),
    "entry.uncertainty": steps.uncertaintyNs(counted).toFixed(1),
  };
}

export function readTraces({ leadTrace, endTrace, stepNs }: PublicCase["data"]): Read {
  return {
    leadNs: readEcho(leadTrace as number[], stepNs as number),
    endNs: readEcho(endTrace as number[], stepNs as number),
  };
}
