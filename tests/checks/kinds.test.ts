import { describe, expect, test } from "vitest";
import type { Answers, CheckKind, CheckPlan, Marking, PublicCase } from "@/lib/checks/kind";
import { correlatorReading } from "@/lib/checks/correlator-reading/correlatorReading";
import { drawCase } from "@/lib/checks/correlator-reading/drawCase";
import { markAnswers as markReading } from "@/lib/checks/correlator-reading/markAnswers";
import { publicCase as readingCase } from "@/lib/checks/correlator-reading/publicCase";
import { ENGINE_VERSION } from "@/lib/checks/engineVersion";
import { quantitiesOf } from "@/lib/checks/definitionsOf";
import { falseLock } from "@/lib/checks/false-lock/falseLock";
import { markAnswers as markFalseLock } from "@/lib/checks/false-lock/markAnswers";
import { publicCase as falseLockCase } from "@/lib/checks/false-lock/publicCase";
import { formula } from "@/lib/checks/formula/formula";
import { KINDS, kindOf } from "@/lib/checks/registry";
import { drawScene } from "@/lib/checks/satellites/drawScene";
import { markAnswers as markSatellites } from "@/lib/checks/satellites/markAnswers";
import { publicCase as satellitesCase } from "@/lib/checks/satellites/publicCase";
import { satellites } from "@/lib/checks/satellites/satellites";
import { drawCase as drawPlan } from "@/lib/checks/search-plan/drawCase";
import { markAnswers as markPlan } from "@/lib/checks/search-plan/markAnswers";
import { publicCase as planCase } from "@/lib/checks/search-plan/publicCase";
import { searchPlan } from "@/lib/checks/search-plan/searchPlan";
import { UNITS, isConvertible } from "@/lib/gnss/units";
import { sceneFor } from "./false-lock/sceneFor";
import { CHAIN, planFrom } from "./formula/plan";
import { planOf, seedOf } from "./planOf";

const seed = seedOf(31);

type Sample = { truth: object; shown: PublicCase; mark: (answers: Answers) => Marking; plan?: CheckPlan };

/** Public case and marking of the kinds that make a capture, without making it, and of those that came before trials. */
const samples: Readonly<Record<string, () => Sample>> = {
  "correlator-reading": () => {
    const plan = planOf(correlatorReading);
    const { truth } = drawCase(seed, plan.parameters);
    return { truth, shown: readingCase(truth, plan), mark: (answers: Answers) => markReading(truth, plan, answers) };
  },
  "false-lock": () => {
    const plan = planOf(falseLock);
    const { truth } = sceneFor(seed);
    return {
      truth,
      shown: falseLockCase(truth, plan),
      mark: (answers: Answers) => markFalseLock(truth, plan, answers, { searched: [], weakPeak: null }),
    };
  },
  satellites: () => {
    const plan = planOf(satellites);
    const { truth } = drawScene(seed, plan.parameters);
    return {
      truth,
      shown: satellitesCase(truth, plan),
      mark: (answers: Answers) => markSatellites(truth, plan, answers, []),
    };
  },
  "search-plan": () => {
    const plan = planOf(searchPlan);
    const { truth } = drawPlan(seed, plan.parameters);
    return { truth, shown: planCase(truth, plan), mark: (answers: Answers) => markPlan(seed, truth, plan, answers) };
  },
  formula: () => sampleOf(formula as CheckKind, planFrom(CHAIN)),
};

/** Any other kind: its case is quickly made. */
function sampleOf(kind: CheckKind, plan: CheckPlan = planOf(kind)): Sample {
  const { truth, publicCase } = kind.build(seed, plan);
  return { truth: truth as object, shown: publicCase, mark: (answers) => kind.mark(seed, plan, answers), plan };
}
/** What a person judges has nothing to draw and nothing to mark. */
const kinds = KINDS.filter(({ judged }) => !judged).map((kind) => [kind.id, kind] as const);

test("every kind, found by name and version", () => {
  expect(KINDS.map(({ id, letter, version }) => `${letter} ${id}@${version}`)).toEqual([
    "A1 correlator-reading@1",
    "A2 false-lock@1",
    "A3 side-peak@1",
    "B1 satellites@1",
    "B2 search-plan@1",
    "D1 cn0@1",
    "D2 lost-decibels@1",
    "E1 chain@1",
    "E3 sky-view@1",
    "F1 interferer@1",
    "F2 stand-off@1",
    "F4 locate@1",
    "F5 jammed-or-not@1",
    "H1 delay-entry@1",
    "H3 pulse-acceptance@1",
    " formula@1",
    " written@1",
  ]);
  for (const kind of KINDS) {
    expect(kindOf(kind.id)).toBe(kind);
    expect(kindOf(kind.id, kind.version)).toBe(kind);
  }
  expect(() => kindOf("no-such-kind")).toThrow(/no kind no-such-kind$/);
  expect(() => kindOf("satellites", 2)).toThrow(/no kind satellites of version 2/);
  expect(() => kindOf("constructor")).toThrow(RangeError);
});

test("the engine says its version", () => expect(ENGINE_VERSION).toMatch(/^\d+\.\d+\.\d+$/));

test("critical is what alone makes the work worthless", () => {
  const critical = KINDS.flatMap((kind) =>
    kind.quantities.filter((one) => one.critical).map((one) => `${kind.letter} ${one.id}`),
  );
  expect(critical).toEqual([
    "A1 detection",
    "A2 verdict",
    "A3 peak",
    "B1 found",
    "B1 invented",
    "D2 cause",
    "E1 feed",
    "E3 choice",
    "F1 class",
    "F4 action",
    "F5 verdict",
    "H1 entry",
    "H3 verdict",
  ]);
});

describe.each(kinds)("%s", (id, kind) => {
  const { truth, shown, mark, plan = planOf(kind) } = samples[id]?.() ?? sampleOf(kind);
  const definitions = quantitiesOf(kind, plan);
  const fields = shown.sections.flatMap((section) => section.fields.map((field) => ({ section, field })));

  test("every parameter has a default inside its own bounds", () => {
    for (const spec of kind.parameters) {
      if (spec.input === "choice") expect(spec.choices.map(({ value }) => value)).toContain(spec.default);
      else
        for (const value of [spec.default].flat()) {
          expect(value >= spec.from && value <= spec.to).toBe(true);
          expect(Object.hasOwn(UNITS, spec.unit)).toBe(true);
          if (spec.whole) expect(Number.isInteger(value)).toBe(true);
        }
    }
    expect(new Set(kind.parameters.map(({ name }) => name)).size).toBe(kind.parameters.length);
  });

  test("every default tolerance lies in the range a lead may set", () => {
    for (const { tolerance, toleranceRange } of definitions) {
      expect(tolerance === null).toBe(toleranceRange === null);
      if (!tolerance || !toleranceRange) continue;
      expect(isConvertible(tolerance.unit, toleranceRange.unit)).toBe(true);
      expect(tolerance.value >= toleranceRange.from && tolerance.value <= toleranceRange.to).toBe(true);
    }
  });

  test("every field belongs to a quantity, and every quantity asked has its tolerance published", () => {
    const ids = definitions.map((quantity) => quantity.id);
    for (const { field } of fields) expect(ids).toContain(field.quantity);
    expect(shown.tolerances.map(({ quantity }) => quantity)).toEqual(ids);
    for (const { tolerance, reason } of shown.tolerances) expect(tolerance && reason).toBeTruthy();
    expect(new Set(fields.map(({ section, field }) => `${section.id}.${field.id}`)).size).toBe(fields.length);
  });

  test("the public case is plain JSON", () => expect(JSON.parse(JSON.stringify(shown))).toEqual(shown));

  test("nothing of seed or truth is in it", () => {
    const text = JSON.stringify(shown);
    expect(text).not.toContain(seed.slice(0, 12));
    expect(text).not.toMatch(
      /"(truth|seed|signal|delayChips|cn0TDb|codePhaseChips|dopplerHz|falsePeaks|verdict|victimPrn|parentPrn|weakPrn|clockPpm|reference|passingPlans)":/,
    );
    for (const number of secretNumbers(truth)) expect(text).not.toContain(number);
  });

  const hostile = [
    "",
    " ",
    "NaN",
    "1e999",
    "-0",
    "\u0000",
    "0x10",
    "1,234",
    "__proto__",
    "9".repeat(5000),
    "∞",
    "7 / 7",
    "<b>1</b>",
  ];
  test.each(hostile)("an answer of %j everywhere is marked, not thrown at", (typed) => {
    const marking = mark(everywhere(shown, typed));
    expect(marking.met).toBe(false);
    for (const row of marking.rows) {
      expect(row.within ? row.reason : row.reason?.length).not.toBe(0);
      if (!row.within) expect(row.reason).toMatch(/[.?]$/);
    }
    expect(JSON.parse(JSON.stringify(marking))).toEqual(marking);
  });

  test("answers to fields that do not exist change nothing", () => {
    const stray = { "reading.constructor": "1", "satellites.99.prn": "7", "verdicts.prn99": "genuine", junk: "5" };
    expect(JSON.stringify(mark(stray))).toBe(JSON.stringify(mark({})));
  });

  test("answers without a prototype are answers", () =>
    expect(JSON.stringify(mark(Object.assign(Object.create(null), everywhere(shown, "5"))))).toBe(
      JSON.stringify(mark(everywhere(shown, "5"))),
    ));

  test("names that every object inherits are no answers", () => {
    const inherited: Answers = Object.create(everywhere(shown, "5"));
    expect(JSON.stringify(mark(inherited))).toBe(JSON.stringify(mark({})));
  });

  test("marking says which marking it is, and the same again the same bytes", () => {
    const answers = everywhere(shown, "5");
    expect(mark(answers).marking).toBe(`${id}@1`);
    expect(JSON.stringify(mark(answers))).toBe(JSON.stringify(mark(answers)));
  });
});

/** Values of the truth with enough figures to be known again; the public case may show none of them. */
function secretNumbers(truth: object): string[] {
  const secret: string[] = [];
  JSON.stringify(truth, (key, value: unknown) => {
    if (key === "trace" || key === "requirement" || key === "log") return undefined; // shown by design
    if (typeof value === "number" && String(value).length > 10 && String(value) !== "2046000")
      secret.push(String(value));
    return value;
  });
  return secret;
}

function everywhere({ sections }: PublicCase, typed: string): Record<string, string> {
  return Object.fromEntries(
    sections.flatMap((section) =>
      section.fields.flatMap((field) =>
        section.repeat
          ? Array.from({ length: section.repeat.max }, (_, n) => [`${section.id}.${n + 1}.${field.id}`, typed])
          : [[`${section.id}.${field.id}`, typed]],
      ),
    ),
  );
}
