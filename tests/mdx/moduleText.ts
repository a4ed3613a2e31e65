import { vi } from "vitest";
import { readModule } from "@/lib/mdx/readModule";

// The parser thread starts once in each file, and on a busy machine that takes seconds.
vi.setConfig({ testTimeout: 60_000 });

export const FRONT_MATTER = `---
code: SBW-X1
title: Try a module
scope: Code-tracking receivers, GPS L1 C/A
limits: Receive only. Not for safety-of-life use.
edition: written to ISO/IEC 17024:2012
valid: { months: 36, reason: receiver families change slowly }
supervision: open
aids: [bench]
sitting: { days: 30, freshCases: 1, waitHours: 24 }
require: { all: [reading] }
---

<Check id="reading" kind="correlator-reading" minutes={15}>
Read the trace.
</Check>

`;

/** Line of the source on which the text given to `moduleOf` begins. */
export const FIRST_LINE = FRONT_MATTER.split("\n").length;

/** A module without a fault, with this text at its end. */
export const moduleOf = (text: string) => `${FRONT_MATTER}${text}`;

/** Problems of that text, with lines counted from its own first one. */
export async function problemsOf(text: string) {
  const { problems } = await readModule(moduleOf(text));
  return problems.map((problem) => ({ ...problem, line: problem.line - FIRST_LINE + 1 }));
}
