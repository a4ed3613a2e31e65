import { describe, expect, test } from "vitest";
import { delayEntry as kind } from "@/lib/checks/delay-entry/delayEntry";
import type { DelayEntryTruth } from "@/lib/checks/delay-entry/drawCase";
import { markAnswers } from "@/lib/checks/delay-entry/markAnswers";
import { readEcho } from "@/lib/checks/delay-entry/readEcho";
import { wayOf, type SitePart } from "@/lib/checks/delay-entry/site";
import { expectNear } from "@/tests/support/expectNear";
import { planOf, seedOf } from "../planOf";

const plan = planOf(kind);

/*
 * A site worked by hand. 30 m of 0.66 are 151.62 ns, 50 m of 0.85 are 196.21 ns (1/(VF 0.299792458) ns per m: definition
 * of the velocity factor). Uncertainties: limits over the root of 3 (JCGM 100:2008, 4.3.7), added as squares (5.1.2).
 */
const part = (id: string, name: string, joints: string, rest: Pick<SitePart, "paper" | "uncertainty">): SitePart => {
  const [from, to] = joints.split(" > ");
  return { id, name, from, to, ...rest };
};
const parts: SitePart[] = [
  part("a", "Antenna with amplifier", "phase centre > joint 1", {
    paper: { says: "delay", ns: 40 },
    uncertainty: { as: "limits", value: 3, unit: "ns" }, // 1.732
  }),
  part("b", "Antenna cable", "joint 1 > joint 2", {
    paper: { says: "cable", installedM: 50, reelM: 100, velocityFactor: 0.85 },
    uncertainty: { as: "limits", value: 2, unit: "%" }, // 3.9243, 2.2657
  }),
  part("c", "10 MHz lead", "10 MHz output > counter", {
    paper: { says: "cable", installedM: 30, reelM: null, velocityFactor: 0.66 },
    uncertainty: { as: "limits", value: 1, unit: "%" },
  }),
  part("d", "Cable in the building", "joint 2 > joint 3", {
    paper: { says: "nothing" }, // (430 - 30)/2 = 200
    uncertainty: { as: "standard", value: 0.8, unit: "ns" },
  }),
  part("e", "Receiver, antenna input to 1PPS output", "joint 3 > joint 4", {
    paper: { says: "delay", ns: 20 },
    uncertainty: { as: "standard", value: 1, unit: "ns" },
  }),
  part("f", "1PPS lead", "joint 4 > clock input", {
    paper: { says: "cable", installedM: 10, reelM: null, velocityFactor: 0.66 }, // 50.54
    uncertainty: { as: "limits", value: 2, unit: "%" }, // 0.5836
  }),
];
const truth: DelayEntryTruth = {
  parts,
  echoes: { leadNs: 30, endNs: 430, stepNs: 0.5, leadTrace: [], endTrace: [] },
  sign: "delay-is-negative",
  note: "What makes the pulse late is typed with a minus sign.",
  delaysNs: [40, 196.214, 0, 200, 20, 50.54],
  totalNs: 506.754,
  entryNs: -506.754,
  uncertaintyNs: 3.1787, // root of 1.7321^2 + 2.2657^2 + 0.8^2 + 1^2 + 0.5836^2
};
const right = {
  "trace.lead": "30",
  "trace.end": "430",
  "parts.a": "40",
  "parts.b": "196.2",
  "parts.c": "0",
  "parts.d": "200",
  "parts.e": "20",
  "parts.f": "50.5",
  "entry.total": "506.7",
  "entry.value": "−507",
  "entry.uncertainty": "3.2",
};
const marked = (answers: Record<string, string>) => markAnswers(truth, plan, { ...right, ...answers });
const rowsOf = (quantity: string, answers: Record<string, string>) =>
  marked(answers).rows.filter((one) => one.quantity === quantity);

test("the site worked by hand is met", () => {
  const marking = marked({});
  expect(marking.rows.filter(({ within }) => !within)).toEqual([]);
  expect(marking.met).toBe(true);
  expect(marking.rows.find(({ quantity }) => quantity === "uncertainty")!.computed).toBe("3.18\u00a0ns");
});

describe("classes of error", () => {
  test.each<[string, string, string, string]>([
    ["parts", "parts.b", "392.4", "drum length"],
    ["parts", "parts.b", "166.8", "speed of light in air"],
    ["parts", "parts.b", "141.8", "velocity factor turned over"],
    ["parts", "parts.b", "-196.2", "sign"],
    ["parts", "parts.c", "151.6", "not on the way"],
    ["parts", "parts.d", "400", "echo not halved"],
    ["parts", "parts.d", "215", "test lead left in"],
    ["parts", "parts.f", "0", "part left out"],
    ["echo", "trace.end", "215", "one way for there and back"],
    ["entry", "entry.value", "507", "sign"],
    ["uncertainty", "entry.uncertainty", "6.38", "added straight"],
    ["uncertainty", "entry.uncertainty", "5.21", "limits for standard"],
  ])("%s: %s of %s is %s", (quantity, field, typed, errorClass) => {
    const outside = rowsOf(quantity, { [field]: typed }).filter(({ within }) => !within);
    expect(outside).toEqual([expect.objectContaining({ errorClass, reason: expect.stringMatching(/\.$/) })]);
  });

  test("twice the standard uncertainty", () => {
    // Without the antenna cable: twice the root of 1.7321^2 + 0.8^2 + 1^2 + 0.5836^2.
    const [row] = rowsOf("uncertainty", { "entry.uncertainty": "4.46", "parts.b": "0" });
    expect(row.errorClass).toBe("expanded for standard");
  });
});

describe("follow-through", () => {
  test("the measured run follows the own echoes", () => {
    const outside = marked({ "trace.end": "440", "parts.d": "205", "entry.total": "511.7", "entry.value": "-511.7" });
    expect(outside.quantities.filter(({ within }) => !within).map(({ of }) => of)).toEqual(["echo"]);
  });

  test("total, entry and uncertainty follow the own parts: a part left out is counted against them once", () => {
    // Without the 1PPS lead: 456.2 ns, root of 1.7321^2 + 2.2657^2 + 0.8^2 + 1^2 = 3.125 ns.
    const marking = marked({
      "parts.f": "0",
      "entry.total": "456.2",
      "entry.value": "-456.2",
      "entry.uncertainty": "3.1",
    });
    expect(marking.quantities.filter(({ within }) => !within).map(({ of }) => of)).toEqual(["parts"]);
  });

  test("a total near 0 has no sign to follow, so the computed one is the base", () => {
    const [row] = rowsOf("entry", { "entry.total": "0", "entry.value": "0" });
    expect(row).toMatchObject({ within: false, critical: true, computed: "−506.8\u00a0ns" });
  });

  test("the wrong sign fails the check alone", () => {
    const marking = markAnswers(truth, { ...plan, needs: 1 }, { ...right, "entry.value": "506.7" });
    expect(marking.met).toBe(false);
    expect(marking.rows.find(({ quantity }) => quantity === "entry")!.reason).toContain("1\u2009013.4\u00a0ns late");
  });
});

describe("units and figures as people type them", () => {
  test.each([
    ["entry.value", "-0.5067 us"],
    ["entry.value", "−507 ns"],
    ["parts.b", "196,2"],
    ["parts.b", "0,1962 µs"],
    ["parts.c", "−0"],
  ])("%s of %s is within", (field, typed) => expect(marked({ [field]: typed }).met).toBe(true));

  test.each(["", "NaN", "1e400", "50 m", "minus 507", "1,234"])("%j is a sentence, never thrown", (typed) => {
    for (const field of Object.keys(right)) {
      const outside = marked({ [field]: typed }).rows.filter(({ within }) => !within);
      expect(outside.length, field).toBeGreaterThan(0);
      for (const { reason } of outside) expect(reason).toMatch(/[.?]$/);
    }
  });

  test("minus zero for the value is no sign", () => expect(marked({ "entry.value": "-0" }).met).toBe(false));
});

test("the way is walked back from the clock; what hangs beside it is left", () =>
  expect(
    wayOf(parts)
      .map(({ id }) => id)
      .join(""),
  ).toBe("abdef"));

test.each([
  ["a part missing", parts.slice(1)],
  ["a loop", [part("a", "x", "joint 1 > clock input", parts[0]), part("b", "y", "clock input > joint 1", parts[0])]],
])("%s is refused", (_what, list) => expect(() => wayOf(list)).toThrow(/^wayOf/));

describe("half-way up", () => {
  // A straight edge from 10 to 20 ns, 1 high: half at 15 ns. Then the traces of a case against what was put in.
  test("of a straight edge", () => {
    const trace = Array.from({ length: 100 }, (_, n) => Math.min(1, Math.max(0, (n - 10) / 10)));
    expectNear(readEcho(trace, 1), 15, 1e-12, "half-way");
    expect(() => readEcho(trace.fill(0), 1)).toThrow(/no edge/);
  });
  test("of a drawn trace", () => {
    const { echoes } = kind.build(seedOf(9), plan).truth;
    expectNear(readEcho(echoes.leadTrace, 0.5), echoes.leadNs, 0.1, "lead");
    expectNear(readEcho(echoes.endTrace, 0.5), echoes.endNs, 0.1, "end");
  });
});

test("marking twice gives the same bytes", () => {
  const [first, second] = [1, 2].map(() => JSON.stringify(kind.mark(seedOf(4), plan, right)));
  expect(second).toBe(first);
});
