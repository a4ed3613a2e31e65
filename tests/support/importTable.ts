/**
 * Which folder may import what: one row per folder, the first that fits counts. A folder may always import from
 * itself. Change a row only together with the reason for it.
 */
export type Row = {
  /** Files whose path begins like this; `*` stands for any part of a path. */
  files: string;
  /** Folders and files of ours. */
  may: readonly string[];
  /** Of these only types, which are gone once compiled. */
  types?: readonly string[];
  /** Packages; `node:` allows all that comes with Node. */
  packages: readonly string[];
};

const SMALL = ["lib/errors", "lib/db", "lib/env", "lib/calendar"];
const WRITING = ["models", "lib/policies", "lib/jobs", "lib/storage", "lib/certificates", "lib/checks", ...SMALL];

const DATA_AND_LOGIC: Row[] = [
  { files: "lib/numeric/", may: [], packages: ["fft.js"] },
  { files: "lib/gnss/", may: ["lib/numeric"], packages: [] },
  { files: "lib/formats/", may: ["lib/numeric", "lib/gnss"], packages: [] },
  // The metadata of a capture carry the hash of its samples; only the worker runs this file.
  { files: "lib/checks/captureFiles.ts", may: ["lib/checks", "lib/gnss"], packages: ["node:crypto"] },
  { files: "lib/checks/", may: ["lib/gnss", "lib/numeric", "lib/formats", "lib/schemas"], packages: [] },
  // What may be typed into a calculator is described once, for its fields, its link and its tag in modules. It is read as
  // answers are read.
  {
    files: "lib/calculators/",
    may: ["lib/checks/parseQuantity", "lib/checks/formatQuantity"],
    types: ["lib/gnss/units"],
    packages: [],
  },
  // Lists that a schema must not repeat: roles, lengths of passwords.
  { files: "lib/schemas/", may: ["lib/gnss/constants", "lib/policies"], packages: ["zod"] },
  { files: "lib/policies/", may: ["lib/errors", "lib/calendar"], packages: [] },
  // The fingerprint of a plan of a check, and what a finished table says of it; for commands and queries alike.
  { files: "lib/release-checks/", may: ["lib/certificates/canonicalJson", "lib/checks"], packages: [] },
  {
    files: "lib/certificates/",
    may: ["lib/errors", "lib/calendar"],
    packages: ["node:crypto", "node:path", "@react-pdf/renderer", "@signpdf/", "asn1js", "pdf-lib", "pkijs", "qrcode"],
  },
  // Hashes and signatures of the trail, shared by the sealer and by whoever checks it.
  { files: "lib/trail/", may: ["lib/certificates/canonicalJson"], packages: ["node:crypto", "jose"] },
  {
    files: "lib/commands/",
    may: [
      ...WRITING,
      "lib/passwords",
      "lib/price",
      "lib/trail",
      // A module is read, and its first text written, by the same rules that the editor shows.
      "lib/mdx",
      "lib/release-checks",
      // The one read that a decision needs inside its own transaction.
      "lib/queries/separationFacts",
      // How often a kind was met, read inside the transaction that assigns or opens.
      "lib/queries/openedCases",
      // A record of a verification says what the public page says, read in the same way.
      "lib/queries/getPublicVerification",
    ],
    packages: ["server-only", "sequelize", "node:crypto"],
  },
  {
    files: "lib/queries/",
    may: [
      "models",
      "lib/policies",
      ...SMALL,
      // A file is held against its own signature, a draft is read, the cards of a module's checks are made.
      ...["lib/certificates", "lib/mdx", "lib/storage", "lib/trail", "lib/release-checks"],
      // What records come to is counted by the core that marks them.
      "lib/checks/statistics",
      // Which markings have been corrected, and what the kinds are called.
      ...["lib/checks/corrections", "lib/checks/registry"],
      // What has stopped is in the queue and in no table of ours.
      ...["lib/jobs/stoppedJobs", "lib/jobs/jobs"],
    ],
    types: ["lib/checks"],
    packages: ["server-only", "sequelize", "node:fs/promises", "jose"],
  },
  {
    files: "lib/auth/",
    // Who signs in is nobody yet, so these two find the person without a query that takes an actor.
    may: ["lib/queries", "lib/commands", "lib/policies", "lib/schemas", "lib/passwords", "lib/log", ...SMALL, "models"],
    packages: ["server-only", "next", "next-auth", "react", "zod", "node:crypto", "rate-limiter-flexible"],
  },
  {
    files: "lib/payments/",
    may: ["models", "lib/commands", "lib/log", ...SMALL],
    types: ["lib/policies"],
    packages: ["server-only", "stripe", "sequelize"],
  },
  { files: "lib/jobs/", may: ["lib/db", "lib/schemas"], packages: ["server-only", "pg-boss", "sequelize", "zod"] },
  {
    files: "lib/worker/",
    may: [
      "lib/commands",
      "lib/queries",
      "lib/checks",
      "lib/release-checks",
      "lib/storage",
      "lib/jobs",
      "lib/log",
      ...SMALL,
    ],
    types: ["lib/certificates"],
    packages: ["server-only", "nodemailer", "pg-boss", "node:"],
  },
  { files: "lib/storage/", may: ["lib/env"], packages: ["server-only", "@aws-sdk/client-s3", "node:"] },
  {
    files: "lib/mdx/",
    may: ["lib/schemas", "lib/checks", "lib/calculators", "lib/gnss/units", "lib/errors"],
    packages: [
      ...["acorn", "hast", "mdast", "mdast-util-mdx", "unified", "vfile", "yaml", "zod", "tsx", "unist-util-visit"],
      ...["rehype-katex", "remark-frontmatter", "remark-gfm", "remark-math", "remark-mdx", "remark-parse"],
      ...["remark-rehype", "@mdx-js/mdx", "node:"],
    ],
  },
  // One small file each: settings, database, errors, log, days, passwords, price.
  {
    files: "lib/*.ts",
    may: ["lib/policies/passwordRule", ...SMALL],
    packages: ["server-only", "zod", "sequelize", "pg", "pino", "@node-rs/argon2"],
  },
  {
    files: "models/",
    may: ["lib/db"],
    types: ["lib/checks", "lib/mdx", "lib/certificates", "lib/policies"],
    packages: ["sequelize"],
  },
  { files: "migrations/", may: [], packages: [] },
  // These run before any package is installed.
  { files: "scripts/register.mjs", may: [], packages: ["node:", "tsx"] },
  { files: "scripts/fakes/", may: ["scripts"], packages: ["node:", "smtp-server", "mailparser"] },
  { files: "scripts/*.mjs", may: ["scripts"], packages: ["node:"] },
  // The runner of the benchmarks, which stand with the tests.
  { files: "scripts/bench", may: ["scripts", "tests/bench"], packages: ["node:"] },
  { files: "scripts/", may: ["lib", "models"], packages: ["node:", "pg", "pg-boss", "sequelize", "asn1js", "pkijs"] },
];

const UI = ["components/ui"];
const VIEWS = ["lib/queries"];

const SCREENS_AND_ENTRANCES: Row[] = [
  {
    files: "app/*/actions.ts",
    may: ["lib/auth", "lib/schemas", "lib/commands", "lib/payments", "lib/policies", "lib/errors"],
    packages: ["server-only", "next", "zod"],
  },
  {
    files: "app/api/",
    may: [
      ...["lib/auth", "lib/queries", "lib/commands", "lib/payments", "lib/storage", "lib/schemas", "lib/errors"],
      // How large a file may be is said once, where it is read.
      ...["lib/certificates/verifyPdf", "lib/env", "lib/log"],
    ],
    packages: ["zod", "next", "node:timers/promises"],
  },
  {
    files: "app/*/_components/",
    // Actions arrive by their route; signing out is every route's.
    // The bench's list is made of the calculators' descriptions.
    may: ["app", "components", "lib/auth/actions", "lib/policies", "lib/calculators", "lib/certificates/supervision"],
    types: [...VIEWS, "lib/checks", "lib/mdx"],
    packages: ["react", "next", "swr", "node:crypto", "@codemirror/", "@lezer/highlight", "@uiw/react-codemirror"],
  },
  {
    files: "app/(public)/",
    // A number is read and asking is throttled before the register is looked at.
    may: [
      "components",
      "lib/queries",
      "lib/calculators",
      "lib/auth/throttlePublic",
      "lib/certificates/number",
      "lib/price",
      "lib/env",
      "lib/log",
    ],
    packages: ["react", "next"],
  },
  {
    files: "app/(auth)/",
    may: ["components", "lib/auth", "lib/schemas", "lib/queries"],
    packages: ["react", "next"],
  },
  {
    files: "app/(work)/",
    may: ["components", "lib/auth", "lib/queries", "lib/policies"],
    packages: ["react", "next"],
  },
  { files: "app/*.ts", may: ["components"], packages: ["react", "next"] },
  { files: "components/ui/", may: [], packages: ["react", "react-dom", "next", "react-aria-components"] },
  { files: "components/plots/", may: ["lib/numeric", ...UI], packages: ["react"] },
  {
    files: "components/calculators/",
    may: ["lib/calculators", "lib/gnss", "lib/numeric", "lib/formats", "components/plots", ...UI],
    packages: ["react", "react-katex", "katex"],
  },
  {
    files: "components/mdx/",
    may: ["components/calculators", "lib/calculators", ...UI],
    types: ["lib/mdx"],
    packages: ["react", "katex", "hast-util-to-jsx-runtime"],
  },
  // The product's own texts, rendered on the server.
  {
    files: "components/site/",
    may: UI,
    packages: ["react", "next", "next-mdx-remote", "remark-gfm", "node:fs/promises", "node:path"],
  },
  {
    files: "components/checks/",
    may: [
      ...["components/calculators", "components/plots", "components/mdx", ...UI],
      // What was typed is understood on the screen as it will be understood in the marking.
      ...["lib/checks/parseQuantity", "lib/checks/formatQuantity"],
    ],
    types: [...VIEWS, "lib/checks/kind"],
    packages: ["react", "next", "swr"],
  },
  { files: "components/", may: ["components/plots", ...UI], types: VIEWS, packages: ["react", "next"] },
  { files: "proxy.ts", may: [], packages: ["next"] },
];

const TESTS: Row[] = [
  // What others have published: none of our code, ever.
  { files: "tests/reference/", may: [], packages: [] },
  ...["numeric", "gnss", "formats", "checks", "policies"].map((name) => ({
    files: `tests/${name}/`,
    may: ["lib", "tests/support/expectNear", "tests/support/clock", "tests/reference"],
    packages: ["vitest", "fast-check", "node:"],
  })),
];

export const IMPORT_TABLE: readonly Row[] = [...DATA_AND_LOGIC, ...SCREENS_AND_ENTRANCES, ...TESTS];
