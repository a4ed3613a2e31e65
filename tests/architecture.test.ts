import { describe, expect, test } from "vitest";
import { IMPORT_TABLE, type Row } from "./support/importTable";
import { callsIn, filesIn, importsOf, read, type Import } from "./support/sourceFiles";

const FILES = filesIn("").filter((file) => !file.startsWith("public/"));
const CODE = FILES.filter((file) => /\.(ts|tsx|mts|mjs)$/.test(file) && !/^next-env\.d\.ts$/.test(file));
const PRODUCT = CODE.filter((file) => !file.startsWith("tests/"));
const withoutComments = (file: string) =>
  read(file)
    .replace(/\/\*[\s\S]*?\*\//g, "")
    .replace(/(^|[^:])\/\/.*$/gm, "$1");

describe("the table of imports", () => {
  const pattern = (files: string) => new RegExp(`^${files.replace(/[.()[\]]/g, "\\$&").replaceAll("*", ".*")}`);
  const rowOf = (file: string) => IMPORT_TABLE.find(({ files }) => pattern(files).test(file));
  const covered = CODE.filter((file) => /^(lib|models|app|components|scripts|proxy\.ts)/.test(file));
  const begins = (name: string, allowed: readonly string[]) =>
    allowed.some(
      (one) => name === one || [one, `${one}/`, `${one}.`].some((part) => /[/:.]$/.test(part) && name.startsWith(part)),
    );

  function refused(row: Row, file: string, { name, typeOnly }: Import): boolean {
    if (!FILES.includes(name)) return !begins(name.replace(/^(@types\/)/, ""), row.packages);
    const own = row.files.includes("*") ? null : row.files.replace(/\/$/, "");
    if (own && begins(name, [own])) return false;
    if (row.files.startsWith("app/") && name.startsWith("app/")) return false;
    return !begins(name, row.may) && !(typeOnly && begins(name, row.types ?? []));
  }

  test("has a row for every folder of the product", () => {
    expect(covered.filter((file) => !rowOf(file))).toEqual([]);
  });

  test.each(IMPORT_TABLE.map((row) => [row.files, row] as const))(
    "%s imports only what its row allows",
    (_files, row) => {
      const files = CODE.filter((file) => rowOf(file) === row);
      const wrong = files.flatMap((file) =>
        importsOf(file)
          .filter((found) => refused(row, file, found))
          .map(({ name, typeOnly }) => `${file}: ${typeOnly ? "type " : ""}${name}`),
      );
      expect(wrong).toEqual([]);
    },
  );

  // What must never be, whatever else a row allows.
  test.each([
    ["lib/numeric/fft.ts", "node:crypto"],
    ["lib/gnss/acquire.ts", "lib/checks/kind.ts"],
    ["lib/checks/registry.ts", "models/index.ts"],
    ["lib/checks/registry.ts", "next/headers"],
    ["lib/schemas/people.ts", "lib/db.ts"],
    ["lib/policies/can.ts", "models/index.ts"],
    ["lib/certificates/record.ts", "models/index.ts"],
    ["lib/commands/decide.ts", "lib/payments/stripe.ts"],
    ["lib/commands/decide.ts", "lib/queries/getSitting.ts"],
    ["lib/commands/decide.ts", "react"],
    ["lib/queries/getCase.ts", "lib/commands/transact.ts"],
    ["lib/payments/stripe.ts", "components/ui/Key.tsx"],
    ["lib/jobs/enqueue.ts", "lib/commands/transact.ts"],
    ["lib/worker/main.ts", "next/cache"],
    ["lib/storage/storage.ts", "models/index.ts"],
    ["lib/mdx/readModule.ts", "models/index.ts"],
    ["lib/db.ts", "components/ui/Key.tsx"],
    ["models/Order.ts", "stripe"],
    ["scripts/start.mjs", "lib/db.ts"],
    ["scripts/start.mjs", "pg"],
    ["scripts/seed.ts", "components/ui/Key.tsx"],
    ["app/(public)/page.tsx", "lib/commands/decide.ts"],
    ["app/(work)/[employer]/desk/page.tsx", "models/index.ts"],
    ["app/(work)/[employer]/desk/page.tsx", "lib/checks/registry.ts"],
    ["app/(work)/[employer]/queue/[sitting]/_components/DecisionForm.tsx", "lib/commands/decide.ts"],
    ["app/(work)/[employer]/queue/[sitting]/_components/DecisionForm.tsx", "lib/queries/getSitting.ts"],
    ["app/(work)/[employer]/queue/[sitting]/actions.ts", "lib/gnss/acquire.ts"],
    ["app/api/stripe/webhook/route.ts", "models/index.ts"],
    ["components/ui/Key.tsx", "lib/policies/can.ts"],
    ["components/plots/LinePlot.tsx", "lib/gnss/acquire.ts"],
    ["components/calculators/TwoCodes.tsx", "lib/checks/registry.ts"],
    ["components/mdx/ModuleTree.tsx", "lib/queries/getModule.ts"],
    ["components/checks/AnswerForm.tsx", "lib/checks/registry.ts"],
    ["components/certificates/CertificateTable.tsx", "lib/commands/decide.ts"],
    ["tests/reference/formulaCases.ts", "lib/gnss/linkBudget.ts"],
    ["tests/gnss/acquire.test.ts", "models/index.ts"],
  ])("%s may not import %s", (file, name) => {
    expect(CODE).toContain(file);
    expect(refused(rowOf(file)!, file, { name, typeOnly: false })).toBe(true);
  });

  test("a route's own pieces are nobody else's", () => {
    const wrong = CODE.flatMap((file) =>
      importsOf(file)
        .map(({ name }) => name)
        .filter((name) => name.includes("/_components/"))
        .filter((name) => !file.startsWith(name.slice(0, name.indexOf("_components/"))) && !file.startsWith("tests/"))
        .map((name) => `${file}: ${name}`),
    );
    expect(wrong).toEqual([]);
  });

  test("the migrations need nothing but themselves", () => {
    const steps = filesIn("migrations").filter((file) => file.endsWith(".js"));
    expect(steps.length).toBeGreaterThan(0);
    for (const file of steps) expect(read(file), file).not.toMatch(/\brequire\(|\bimport\b/);
  });
});

describe("files", () => {
  test("have at most 300 lines, tables of published values excepted", () => {
    const long = [...CODE, ...FILES.filter((file) => file.endsWith(".css"))]
      .filter((file) => !file.startsWith("tests/reference/"))
      .map((file) => [file, read(file).split("\n").length - 1] as const)
      .filter(([, lines]) => lines > 300);
    expect(long).toEqual([]);
  });

  test("stand under the names that the project began with", () => {
    const tops = [...new Set(FILES.map((file) => file.split("/")[0]!))];
    expect(tops.filter((name) => !TOP.includes(name))).toEqual([]);
  });

  test("no file or folder is called by what it is not about", () => {
    expect(FILES.filter((file) => /(^|\/)(utils?|helpers?|common|misc|shared)(\/|\.\w+$)/i.test(file))).toEqual([]);
  });

  test("none but models/index.ts only hands on what others export", () => {
    const handsOn = (file: string) => {
      const lines = withoutComments(file)
        .split("\n")
        .map((line) => line.trim());
      const code = lines.filter((line) => line !== "" && line !== 'import "server-only";');
      return code.length > 0 && code.every((line) => /^export (type )?(\*|\{.*\}) from /.test(line));
    };
    // Next finds the page for what is not there by its file's name.
    const may = /^(models\/index\.ts|app\/.*\/not-found\.tsx)$/;
    const found = CODE.filter((file) => /(^|\/)index\.tsx?$/.test(file) || handsOn(file));
    expect(found.filter((file) => !may.test(file))).toEqual([]);
  });

  test("every model is handed on by models/index.ts", () => {
    const models = filesIn("models").filter((file) => file !== "models/index.ts");
    expect(
      importsOf("models/index.ts")
        .map(({ name }) => name)
        .sort(),
    ).toEqual(models.sort());
  });

  test("a default export is there only where Next or a tool asks for one", () => {
    const asked =
      /^(app\/.*(page|layout|error|not-found|template|default|loading|global-error)\.tsx|[^/]+\.(ts|mts|mjs)|lib\/auth\/.*\.d\.ts)$/;
    expect(CODE.filter((file) => /^export default /m.test(read(file)) && !asked.test(file))).toEqual([]);
  });
});

describe("the server's own code", () => {
  const folders = ["commands", "queries", "auth", "payments", "jobs"];
  const needed = CODE.filter(
    (file) => folders.some((name) => file.startsWith(`lib/${name}/`)) || file === "lib/db.ts",
  ).filter((file) => !file.endsWith(".d.ts"));

  test("says so in its first line, so that no page can send it to a browser", () => {
    const first = (file: string) =>
      read(file)
        .replace(/^"use server";\n/, "")
        .split("\n")[0];
    expect(needed.filter((file) => first(file) !== 'import "server-only";')).toEqual([]);
  });

  test("is asked by a browser through files of actions only", () => {
    const asked = CODE.filter((file) => /^\s*["']use server["']/m.test(read(file)));
    expect(asked.filter((file) => !/^(app\/.*\/actions\.ts|lib\/auth\/actions\.ts)$/.test(file))).toEqual([]);
    for (const file of asked) expect(read(file).startsWith('"use server";'), file).toBe(true);
  });
});

describe("what is computed", () => {
  const pure = CODE.filter((file) => /^lib\/(numeric|gnss|formats|checks)\//.test(file));
  // Every other function of Math may differ between engines, by the language's own standard.
  const EXACT = "abs ceil clz32 floor imul max min round sign sqrt trunc PI SQRT1_2 SQRT2".split(" ");

  test("uses exactly rounded arithmetic only", () => {
    const used = pure.flatMap((file) =>
      [...withoutComments(file).matchAll(/\bMath\.(\w+)/g)].map(([, name]) => [file, name!] as const),
    );
    expect(used.filter(([, name]) => !EXACT.includes(name))).toEqual([]);
    expect(pure.filter((file) => /\w\s*\*\*=?\s*[\w(]|\bMath\s*[[;,)]/.test(withoutComments(file)))).toEqual([]);
  });

  test("depends on no clock, no language of a machine and no chance but the seed's", () => {
    const impure =
      /\bDate\.now|new Date\(\s*\)|\bperformance\.|\bIntl\b|\.toLocale|localeCompare|randomBytes|randomUUID|getRandomValues|process\.|globalThis|\bfetch\(/;
    expect(pure.filter((file) => impure.test(withoutComments(file)))).toEqual([]);
  });
});

describe("product code", () => {
  test("hushes no tool, leaves nothing to do, and talks to nobody's console", () => {
    const left = /eslint-disable|@ts-(ignore|expect-error|nocheck)|\bTODO\b|\bFIXME\b/;
    expect(CODE.filter((file) => left.test(read(file)) && file !== "tests/architecture.test.ts")).toEqual([]);
    const talks = PRODUCT.filter((file) => !file.startsWith("scripts/") && /\bconsole\./.test(withoutComments(file)));
    expect(talks).toEqual([]);
  });

  test("runs nothing that a lead or a technician has written", () => {
    const runs = /\beval\(|new Function\(|\bvm\b.*runIn|dangerouslySetInnerHTML/;
    expect(PRODUCT.filter((file) => runs.test(withoutComments(file)))).toEqual([]);
  });
});

describe("tests", () => {
  const tests = CODE.filter((file) => file.startsWith("tests/") && file !== "tests/architecture.test.ts");

  test("none is skipped, focused, left open, or compared with an earlier run of itself", () => {
    const weak =
      /\b(test|it|describe)\.(skip|only|todo|fails)\b|toMatchSnapshot|toMatchInlineSnapshot|toMatchFileSnapshot|toBeCloseTo/;
    expect(tests.filter((file) => weak.test(withoutComments(file)))).toEqual([]);
  });

  test("none depends on the day it runs or on chance of its own", () => {
    const chance = ["new Date()", "Date.now()", "Math.random()"];
    const wrong = tests.filter((file) => callsIn(file).some((call) => chance.includes(call)));
    expect(wrong).toEqual([]);
  });

  test("a pattern is compared by a matcher: as a member of an object any pattern would do", () => {
    expect(
      tests.filter((file) => /(toMatchObject|toEqual|objectContaining)\([^;]*?\w: \/[^/*]/.test(withoutComments(file))),
    ).toEqual([]);
  });
});

const TOP = [
  ...[".ci", ".env.example", ".gitignore", ".npmrc", ".prettierignore", ".prettierrc.json", ".sequelizerc"],
  ...["DEVELOPERS.md", "LICENSE", "README.md", "app", "components", "content", "fonts", "lib", "migrations", "models"],
  ...["public", "scripts", "tests", "package.json", "package-lock.json", "proxy.ts", "tsconfig.json"],
  ...["eslint.config.mjs", "next.config.mjs", "postcss.config.mjs", "tailwind.config.ts", "vitest.config.mts"],
  // Written by Next and by the compiler, and kept out of the repository.
  ...["next-env.d.ts", "tsconfig.tsbuildinfo"],
];
