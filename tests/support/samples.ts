import type { CheckPlan, MarkedRow, PublicCase } from "@/lib/checks/kind";
import type { FrontMatter } from "@/lib/mdx/frontMatter";
import type { ModuleTree } from "@/lib/mdx/moduleTree";

/** What the JSON columns of the chain hold when a test has nothing of its own to say about them. */
export const checkPlan = (over: Partial<CheckPlan> = {}): CheckPlan => ({
  id: "reading",
  kind: "correlator-reading",
  version: 1,
  title: "Read a correlator trace",
  minutes: 20,
  needs: null,
  parameters: { prn: [1, 32], cn0T: [16, 24], falseAlarm: 1e-6, noiseOnly: 20 },
  quantities: [],
  ...over,
});

/** A written account of two lines, the first critical. */
export const writtenPlan = (): CheckPlan => ({
  id: "account",
  kind: "written",
  version: 1,
  title: "What you saw",
  minutes: 20,
  needs: null,
  parameters: {
    lines: [
      { id: "seen", label: "what you saw", critical: true },
      { id: "done", label: "what you did", critical: false },
    ],
  },
  quantities: [
    { of: "seen", tolerance: null, critical: true },
    { of: "done", tolerance: null, critical: false },
  ],
});

export const writtenCase = (): PublicCase =>
  publicCase({
    kind: "written",
    title: "What you saw",
    sections: [
      {
        id: "account",
        title: "Your account",
        fields: [
          { id: "seen", label: "what you saw", input: "text", longest: 2000, quantity: "seen" },
          { id: "done", label: "what you did", input: "text", longest: 2000, quantity: "done" },
        ],
      },
    ],
    tolerances: [
      {
        quantity: "seen",
        label: "what you saw",
        tolerance: "judged",
        critical: true,
        reason: "Judged by an assessor.",
      },
      {
        quantity: "done",
        label: "what you did",
        tolerance: "judged",
        critical: false,
        reason: "Judged by an assessor.",
      },
    ],
  });

export const frontMatter = (over: Partial<FrontMatter> = {}): FrontMatter => ({
  code: "TEST-1",
  title: "Prove a satellite",
  scope: "Code-tracking receivers, GPS L1 C/A",
  limits: "Receive only",
  edition: "written to the firm's procedure 7",
  valid: { months: 36, reason: "receiver families change slowly" },
  supervision: "open",
  aids: ["bench"],
  sitting: { days: 30, freshCases: 1, waitHours: 24 },
  require: { all: ["reading"], some: null },
  ...over,
});

export const TREE: ModuleTree = {
  type: "root",
  children: [{ type: "element", tagName: "p", properties: {}, children: [{ type: "text", value: "Find the peak." }] }],
};

export const LAG = "Lag of the highest cell";

export const publicCase = (over: Partial<PublicCase> = {}): PublicCase => ({
  kind: "correlator-reading",
  version: 1,
  title: "Read a correlator trace",
  brief: ["Read the highest peak."],
  given: [{ label: "PRN", value: "7" }],
  cautions: ["transmit"],
  sections: [
    {
      id: "peak",
      title: "The peak",
      fields: [{ id: "lag", label: LAG, input: "number", unit: "chip", quantity: "lag" }],
    },
  ],
  tolerances: [{ quantity: "lag", label: LAG, tolerance: "0.2 chip", critical: false, reason: "Noise moves the top." }],
  data: {},
  ...over,
});

export const markedRow = (within: boolean): MarkedRow => ({
  quantity: "lag",
  subject: null,
  label: LAG,
  handedIn: "88.75 chip",
  understood: "88.75 chip",
  computed: within ? "88.8 chip" : "91.2 chip",
  difference: within ? "\u22120.05 chip" : "\u22122.45 chip",
  tolerance: "0.2 chip",
  offByTolerances: within ? -0.25 : -12.25,
  within,
  critical: false,
  errorClass: null,
  reason: within ? null : "This is not the highest cell.",
});
