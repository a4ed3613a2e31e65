import type { CheckKind, CheckPlan, Marking } from "@/lib/checks/kind";
import type { TriedKind } from "@/lib/checks/release-check/tryCase";
import { seededRandom } from "@/lib/numeric/random";

/** What the sample kind below does wrong on purpose. */
export type Faults = {
  refuses?: number;
  unfair?: number;
  misread?: number;
  wrongMeets?: number;
  guessMeets?: number;
  same?: number;
};

/** A kind whose every outcome is drawn with a rate that the test states. The answer is one whole number, 0 to 9. */
export function sampleKind(faults: Faults = {}): TriedKind {
  const share = (seedHex: string, name: string, rate = 0) => seededRandom(seedHex, name).uniform() < rate;
  const judge = (truth: Truth, typed: string): Marking => {
    const within = typed === String(truth.value);
    const row = { subject: null, label: "Value", computed: "", difference: null, tolerance: "", offByTolerances: null };
    return {
      marking: "sample@1",
      rows: [
        {
          ...row,
          quantity: "value",
          handedIn: typed,
          understood: null,
          within,
          critical: true,
          errorClass: null,
          reason: null,
        },
      ],
      quantities: [{ of: "value", label: "Value", critical: true, within }],
      ...{ needs: 1, withinCount: within ? 1 : 0, met: within, workings: [] },
    };
  };
  const build = (seedHex: string) => {
    if (share(seedHex, "refuses", faults.refuses)) throw new Error("no fair case in 10 draws");
    const value = seededRandom(seedHex, "value").integer(0, 9);
    return { truth: { seedHex, value }, publicCase: PUBLIC, files: [], draws: 2 };
  };
  const other = (value: number) => String((value + 1) % 10);
  const kind: CheckKind<unknown, Truth> = {
    ...{
      id: "sample",
      version: 1,
      letter: "Z1",
      title: "Sample",
      defaultMinutes: 5,
      parameters: [],
      quantities: [],
      cautions: [],
    },
    build,
    mark: (seedHex, _plan, answers) => judge(build(seedHex).truth, answers.value ?? ""),
    solve: ({ truth }) => ({ value: String(truth.value) }),
    wrongMethods: {
      other: {
        label: "Another value",
        misses: ["value"],
        solve: ({ truth: { seedHex, value } }) => ({
          value:
            share(seedHex, "same", faults.same) || share(seedHex, "wrong", faults.wrongMeets)
              ? `${value}`
              : other(value),
        }),
      },
    },
    trial: {
      whole: true,
      build,
      judge: ({ truth }, _plan, answers) => judge(truth, answers.value ?? ""),
      read: ({ truth }, _plan, random) => ({
        value: random.uniform() < (faults.misread ?? 0) ? other(truth.value) : String(truth.value),
      }),
      guess: (_shown, _plan, random) => ({
        value: random.uniform() < (faults.guessMeets ?? 1) ? String(random.integer(0, 9)) : "",
      }),
      difficulty: ({ truth }) => [
        { label: "share", unit: "1", value: share(truth.seedHex, "unfair", faults.unfair) ? 2 : 0.5, from: 0, to: 1 },
      ],
    },
  };
  return kind as unknown as TriedKind;
}

type Truth = { seedHex: string; value: number };

const PUBLIC = {
  ...{
    kind: "sample",
    version: 1,
    title: "",
    brief: [],
    given: [],
    cautions: [],
    sections: [],
    tolerances: [],
    data: {},
  },
};

export const samplePlan: CheckPlan = {
  ...{
    id: "sample",
    kind: "sample",
    version: 1,
    title: "Sample",
    minutes: 5,
    needs: null,
    parameters: {},
    quantities: [],
  },
};
