import fs from "node:fs";
import path from "node:path";

const root = path.resolve(import.meta.dirname, "../..");

/** Where the product can be entered, read from the code. Names are those of the rows in tests/entrances/rows.ts. */
export const pages = (): string[] => filesNamed(/^page\.tsx$/, "app").map((file) => addressOf(path.dirname(file)));

/** "GET /api/trail/heads", one for each method that a handler exports. */
export const routes = (): string[] =>
  filesNamed(/^route\.ts$/, "app").flatMap((file) =>
    exportsOf(file)
      .filter((name) => /^(GET|HEAD|POST|PUT|PATCH|DELETE|OPTIONS)$/.test(name))
      .map((method) => `${method} ${addressOf(path.dirname(file))}`),
  );

export type ServerAction = { name: string; file: string };

/** Everything that a browser may call by name: all that files marked "use server" give away. */
export const actions = (): ServerAction[] =>
  ["app", "components", "lib"]
    .flatMap((folder) => filesNamed(/\.tsx?$/, folder))
    .filter((file) => /^\s*["']use server["']/.test(read(file)))
    .flatMap((file) => exportsOf(file).map((name) => ({ name, file })));

/** "use server" inside a function makes an entrance that no list of exports shows. */
export const hiddenActions = (): string[] =>
  ["app", "components", "lib"]
    .flatMap((folder) => filesNamed(/\.tsx?$/, folder))
    .filter((file) => /\S[^\n]*["']use server["']|\n[ \t]+["']use server["']/.test(read(file)));

export const read = (file: string): string => fs.readFileSync(path.join(root, file), "utf8");
export const exists = (file: string): boolean => fs.existsSync(path.join(root, file));

// Folders in parentheses group files and are no part of an address.
const addressOf = (folder: string) =>
  `/${folder
    .split("/")
    .slice(1)
    .filter((part) => !/^\(.*\)$/.test(part))
    .join("/")}`;

// Types are gone at run time; everything else that is exported can be called.
const exportsOf = (file: string): string[] =>
  [...read(file).matchAll(/^export\s+(?:async\s+)?(?:function\*?|const|let|var|class)\s+(\w+)/gm)].map(
    ([, name]) => name!,
  );

const filesNamed = (name: RegExp, folder: string): string[] =>
  fs
    .readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && name.test(entry.name))
    .map((entry) => path.relative(root, path.join(entry.parentPath, entry.name)))
    .sort();
