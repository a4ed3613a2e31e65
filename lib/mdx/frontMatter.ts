import { z } from "zod";

// Each message completes "<name> must ...".
const text = (from: number, to: number) => {
  const error = `be one line of ${from} to ${to} characters`;
  return z
    .string({ error })
    .trim()
    .min(from, { error })
    .max(to, { error })
    .regex(/^\P{Cc}*$/u, { error });
};

const whole = (from: number, to: number) => {
  const error = `be a whole number from ${from} to ${to}`;
  return z.number({ error }).int({ error }).min(from, { error }).max(to, { error });
};

const CODE = "be 2 to 24 capital letters, figures and hyphens";
const CHECK_IDS = "be a list of check ids in square brackets";

const checkIds = z.array(z.string({ error: CHECK_IDS }), { error: CHECK_IDS }).max(12, { error: CHECK_IDS });

export const frontMatterSchema = z.strictObject({
  code: z.string({ error: CODE }).regex(/^(?=.{2,24}$)[A-Z0-9]+(-[A-Z0-9]+)*$/, { error: CODE }),
  title: text(3, 120),
  scope: text(3, 300),
  limits: text(3, 300),
  edition: text(3, 120),
  valid: z.strictObject({ months: whole(1, 120), reason: text(3, 200) }, { error: "have months and reason" }),
  supervision: z.enum(["open", "remote", "on-site"], { error: "be open, remote or on-site" }),
  aids: z
    .array(text(2, 80), { error: "be a list of at most 10 aids" })
    .max(10, { error: "be a list of at most 10 aids" }),
  sitting: z.strictObject(
    { days: whole(1, 365), freshCases: whole(0, 5), waitHours: whole(0, 720), exposure: whole(1, 12).optional() },
    { error: "have days, freshCases and waitHours, and may have exposure" },
  ),
  require: z.strictObject(
    {
      all: checkIds.optional().transform((ids) => ids ?? []),
      some: z
        .strictObject({ of: checkIds, count: whole(1, 12) }, { error: "have of and count" })
        .optional()
        .transform((some) => some ?? null),
    },
    { error: "have all, some, or both" },
  ),
});

export type FrontMatter = z.infer<typeof frontMatterSchema>;

/** What to write instead of a missing or wrong line, by path. Also offered by the editor. */
export const FRONT_MATTER_EXAMPLES: Readonly<Record<string, string>> = {
  code: "code: SBW-R2",
  title: "title: Prove which satellites you really have",
  scope: "scope: Code-tracking receivers on machines and stations, GPS L1 C/A",
  limits: "limits: Receive only. Not for safety-of-life use.",
  edition: "edition: written to ISO/IEC 17024:2012",
  valid: "valid: { months: 36, reason: receiver families change slowly }",
  "valid.months": "months: 36",
  "valid.reason": "reason: receiver families change slowly",
  supervision: "supervision: open",
  aids: "aids: [bench]",
  sitting: "sitting: { days: 30, freshCases: 1, waitHours: 24, exposure: 3 }",
  "sitting.days": "days: 30",
  "sitting.freshCases": "freshCases: 1",
  "sitting.waitHours": "waitHours: 24",
  // Cases of one kind that a person opens in 12 months; 3 when left out.
  "sitting.exposure": "exposure: 3",
  require: "require: { all: [false-lock, satellites] }",
  "require.all": "all: [false-lock, satellites]",
  "require.some": "some: { of: [reading, plan], count: 1 }",
  "require.some.of": "of: [reading, plan]",
  "require.some.count": "count: 1",
};
