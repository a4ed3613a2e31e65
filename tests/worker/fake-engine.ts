import { createHash } from "node:crypto";
import type { BuiltCase, CheckPlan, Marking } from "@/lib/checks/kind";
import type { Engine } from "@/lib/commands/engine";
import { markedRow, publicCase } from "../support/samples";

/** A value that stands in the truth and nowhere else. */
const truthOf = (seedHex: string) => ({
  ...{ lagChips: 88.8, draw: `truth-${seedHex.slice(0, 16)}`, dataBits: Int8Array.of(1, -1) },
});
const bytesOf = (seedHex: string) => new Uint8Array(createHash("sha256").update(seedHex).digest());

export const builtCase = (seedHex: string): BuiltCase => ({
  truth: truthOf(seedHex),
  publicCase: publicCase(),
  files: [
    { name: "capture.sigmf-data", mediaType: "application/octet-stream", bytes: bytesOf(seedHex) },
    // The same in every case, whatever the seed.
    { name: "capture.sigmf-meta", mediaType: "application/json", bytes: new TextEncoder().encode("{}") },
  ],
  draws: 12,
});

export const marking = (met: boolean): Marking => ({
  marking: "correlator-reading@1",
  rows: [markedRow(met)],
  quantities: [{ of: "lag", label: "Lag of the highest cell", critical: false, within: met }],
  needs: 1,
  withinCount: met ? 1 : 0,
  met,
  workings: [{ label: "PRN", value: "7" }],
});

/** Computes at once and keeps what it was asked; the real kinds are tested by themselves. */
export class FakeEngine implements Engine {
  readonly seeds: string[] = [];
  readonly asked: { plan: CheckPlan; answers: object }[] = [];

  constructor(
    private readonly over: { met?: boolean; truth?: unknown; name?: string; before?: () => Promise<unknown> } = {},
  ) {}

  async build(seedHex: string): Promise<BuiltCase> {
    this.seeds.push(seedHex);
    await this.over.before?.();
    return builtCase(seedHex);
  }

  async mark(seedHex: string, plan: CheckPlan, answers: object) {
    this.seeds.push(seedHex);
    this.asked.push({ plan, answers });
    await this.over.before?.();
    return { truth: this.over.truth ?? truthOf(seedHex), marking: this.#marking() };
  }

  #marking(): Marking {
    const { met = true, name } = this.over;
    return { ...marking(met), ...(name !== undefined && { marking: name }) };
  }
}
