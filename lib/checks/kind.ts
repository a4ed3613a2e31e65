import type { Unit } from "@/lib/gnss/units";
import type { Random } from "@/lib/numeric/random";

/** As typed, by field id; a field of a repeated section has its line number in the id, `satellites.3.doppler`. */
export type Answers = Readonly<Record<string, string>>;

export type Choice = { value: string; label: string };

export type FieldSpec = {
  id: string;
  label: string;
  input: "number" | "choice" | "text";
  unit?: Unit;
  /** The number may be below zero: a phone's keyboard of figures has no minus. */
  signed?: boolean;
  choices?: readonly Choice[];
  /** Characters of a text that is longer than a line. */
  longest?: number;
  help?: string;
  quantity: string;
};

/** Field ids are `${section.id}.${field.id}`, or `${section.id}.${n}.${field.id}` with n from 1 when the section repeats. */
export type FormSection = {
  id: string;
  title: string;
  repeat?: { max: number; add: string };
  fields: readonly FieldSpec[];
};

export type TolerancePublic = {
  quantity: string;
  label: string;
  tolerance: string;
  critical: boolean;
  reason: string;
};

export type CautionTopic = "height" | "lightning" | "mains" | "rf" | "transmit" | "life";

/** All that leaves the server before the hand-in. `data` is the kind's own, plain JSON. */
export type PublicCase = {
  kind: string;
  version: number;
  title: string;
  brief: string[];
  given: { label: string; value: string }[];
  cautions: CautionTopic[];
  sections: FormSection[];
  tolerances: TolerancePublic[];
  data: Record<string, unknown>;
};

export type CaseFile = { name: string; mediaType: string; bytes: Uint8Array };

export type ToleranceValue = { value: number; unit: Unit };

/** One check of a release. No quantity named means all of the kind's quantities, as the kind defines them. */
export type CheckPlan<P = unknown> = {
  id: string;
  kind: string;
  version: number;
  title: string;
  minutes: number;
  needs: number | null;
  parameters: P;
  quantities: { of: string; tolerance: ToleranceValue | null; critical: boolean }[];
};

export type BuiltCase<T = unknown> = { truth: T; publicCase: PublicCase; files: CaseFile[]; draws: number };

export type MarkedRow = {
  quantity: string;
  subject: string | null;
  label: string;
  handedIn: string;
  understood: string | null;
  computed: string;
  difference: string | null;
  tolerance: string;
  /** Signed, handed in minus computed; null where a difference has no meaning. */
  offByTolerances: number | null;
  within: boolean;
  critical: boolean;
  errorClass: string | null;
  reason: string | null;
};

export type Marking = {
  /** Kind and version of the marking, "false-lock@1". */
  marking: string;
  rows: MarkedRow[];
  quantities: { of: string; label: string; critical: boolean; within: boolean }[];
  needs: number;
  withinCount: number;
  met: boolean;
  workings: { label: string; value: string }[];
};

export type Progress = (done: number, total: number, step: string) => void;

/** A parameter a lead may write as an attribute of `<Check>`; every one has a default, so that none must be written. */
export type ParameterSpec = { name: string; label: string; help: string } & (
  | { input: "number"; unit: Unit; from: number; to: number; whole: boolean; default: number }
  | { input: "range"; unit: Unit; from: number; to: number; whole: boolean; default: readonly [number, number] }
  | { input: "choice"; choices: readonly Choice[]; default: string }
);

/** `tolerance` null: exact, or computed from the hand-in as `reason` says; `toleranceRange` is what a lead may set, in its unit. */
export type QuantityDefinition = {
  id: string;
  label: string;
  unit: Unit | null;
  choices?: readonly Choice[];
  tolerance: ToleranceValue | null;
  toleranceRange: { from: number; to: number; unit: Unit } | null;
  critical: boolean;
  reason: string;
};

export interface CheckKind<P = unknown, T = unknown> {
  readonly id: string;
  readonly version: number;
  /** Place in the catalogue of practical checks: A1, A2, B1, ... */
  readonly letter: string;
  readonly title: string;
  readonly defaultMinutes: number;
  readonly parameters: readonly ParameterSpec[];
  /** Empty where the plan brings its own; ask `quantitiesOf`. */
  readonly quantities: readonly QuantityDefinition[];
  readonly cautions: readonly CautionTopic[];
  /** Parameters that are each in range and still cannot be drawn from together; null when they can. */
  parametersProblem?(parameters: P): { name: string; message: string } | null;
  build(seedHex: string, plan: CheckPlan<P>, progress?: Progress): BuiltCase<T>;
  mark(seedHex: string, plan: CheckPlan<P>, answers: Answers, progress?: Progress): Marking;
  /** The right method with a careful reading, from the public case and its files alone. */
  solve(built: BuiltCase<T>, plan: CheckPlan<P>): Answers;
  /** Empty where the plan brings its own; ask `wrongMethodsOf`. */
  readonly wrongMethods: Readonly<Record<string, WrongMethod<P, T>>>;
  /** Where the lead defines the check: what the plan brings in place of the kind's own lists. */
  readonly ofPlan?: PlanDefinitions<P, T>;
  /** An assessor judges the hand-in line by line; `mark` is never asked. */
  readonly judged?: true;
  /** How the release check tries the kind; absent only where no machine marks. */
  readonly trial?: Trial<P, T>;
}

/** What a lead has written into a plan, in the form that a catalogue kind has it. */
export interface PlanDefinitions<P = unknown, T = unknown> {
  quantities(plan: CheckPlan<P>): readonly QuantityDefinition[];
  wrongMethods(plan: CheckPlan<P>): Readonly<Record<string, WrongMethod<P, T>>>;
}

/** People who never existed, each with a case of their own. Same seed and same draws, same outcome. */
export interface Trial<P = unknown, T = unknown> {
  /** Whether `build` makes the whole case; a search kind leaves its samples out here and is tried whole on a few cases. */
  readonly whole: boolean;
  /** The case as far as the methods below and the wrong methods look at it. */
  build(seedHex: string, plan: CheckPlan<P>): BuiltCase<T>;
  /** What `mark` finds for that case, without what only its workings need. */
  judge(built: BuiltCase<T>, plan: CheckPlan<P>, answers: Answers): Marking;
  /** What the right method finds, nothing read wrong; only where `solve` needs the samples that this case leaves out. */
  solve?(built: BuiltCase<T>, plan: CheckPlan<P>): Answers;
  /** The right method as competent people carry it out: every reading off by what eye, cursor and noise make of it. */
  read(built: BuiltCase<T>, plan: CheckPlan<P>, random: Random): Answers;
  /** Somebody who knows the form and the usual ranges, and looks at nothing else. */
  guess(publicCase: PublicCase, plan: CheckPlan<P>, random: Random): Answers;
  /** How hard this case is. A case outside one of its bands is unfair. */
  difficulty(built: BuiltCase<T>, plan: CheckPlan<P>): Difficulty[];
}

export type Difficulty = { label: string; unit: Unit; value: number; from: number; to: number };

export interface WrongMethod<P = unknown, T = unknown> {
  readonly label: string;
  /** Quantities that it gets outside in every case; others it may get outside as well. */
  readonly misses: readonly string[];
  solve(built: BuiltCase<T>, plan: CheckPlan<P>): Answers;
}
