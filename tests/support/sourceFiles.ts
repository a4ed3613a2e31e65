import { existsSync, readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import ts from "typescript";

export const ROOT = path.resolve(import.meta.dirname, "../..");
const NOT_OURS = /^(node_modules|\.git|\.data|\.next.*)$/;

/** Every file of a folder of the project, as paths from its root; what is installed, built or kept as data is left out. */
export function filesIn(folder: string): string[] {
  const entries = readdirSync(path.join(ROOT, folder), { withFileTypes: true });
  return entries.flatMap((entry) => {
    const name = path.posix.join(folder, entry.name);
    if (NOT_OURS.test(entry.name)) return [];
    return entry.isDirectory() ? filesIn(name) : [name];
  });
}

export const read = (file: string): string => readFileSync(path.join(ROOT, file), "utf8");

export type Import = { name: string; typeOnly: boolean };

/** What a file imports: paths from the root for files of ours, names for packages. */
export function importsOf(file: string): Import[] {
  const source = ts.createSourceFile(file, read(file), ts.ScriptTarget.Latest, false);
  const found: Import[] = [];
  const visit = (node: ts.Node): void => {
    const specifier = specifierOf(node);
    if (specifier) found.push({ name: resolved(file, specifier), typeOnly: isTypeOnly(node) });
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}

/** Of `import`, `export ... from`, `import()` and of a worker's `new URL("./file", import.meta.url)`. */
function specifierOf(node: ts.Node): string | null {
  if ((ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier)
    return textOf(node.moduleSpecifier);
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) return textOf(node.argument.literal);
  if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword)
    return textOf(node.arguments[0]);
  const isUrl = ts.isNewExpression(node) && ts.isIdentifier(node.expression) && node.expression.text === "URL";
  const [target, base] = isUrl ? (node.arguments ?? []) : [];
  return base && ts.isPropertyAccessExpression(base) && base.name.text === "url" ? textOf(target) : null;
}

const textOf = (node: ts.Node | undefined): string | null => (node && ts.isStringLiteralLike(node) ? node.text : null);

function isTypeOnly(node: ts.Node): boolean {
  if (ts.isImportTypeNode(node)) return true;
  if (ts.isExportDeclaration(node)) return node.isTypeOnly;
  if (!ts.isImportDeclaration(node) || !node.importClause) return false;
  const { name, namedBindings, phaseModifier } = node.importClause;
  if (phaseModifier === ts.SyntaxKind.TypeKeyword) return true;
  const named = namedBindings && ts.isNamedImports(namedBindings) ? namedBindings.elements : [];
  return !name && named.length > 0 && named.every((element) => element.isTypeOnly);
}

function resolved(file: string, specifier: string): string {
  if (specifier.startsWith("@/")) return withEnding(specifier.slice(2));
  if (specifier.startsWith(".")) return withEnding(path.posix.join(path.posix.dirname(file), specifier));
  return specifier;
}

const ENDINGS = ["", ".ts", ".tsx", ".mts", ".mjs", ".d.ts", "/index.ts"];
const withEnding = (name: string): string =>
  ENDINGS.map((ending) => name + ending).find(
    (candidate) => /\.\w+$/.test(candidate) && existsSync(path.join(ROOT, candidate)),
  ) ?? name;

/** The text of every call and `new` of a file; what stands in strings and comments is none. */
export function callsIn(file: string): string[] {
  const source = ts.createSourceFile(file, read(file), ts.ScriptTarget.Latest, true);
  const found: string[] = [];
  const visit = (node: ts.Node): void => {
    if (ts.isCallExpression(node)) found.push(`${node.expression.getText()}(${node.arguments.length || ""})`);
    if (ts.isNewExpression(node)) found.push(`new ${node.expression.getText()}(${node.arguments?.length || ""})`);
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}
