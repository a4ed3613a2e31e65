import { expect } from "vitest";

/** Stored as a whole and handed on as a whole: what is in them is another test's matter. */
type Opaque = readonly string[];

/**
 * Names of all fields of a view, `cases[].id` for those of a list's members, so that a field that slips in is seen.
 * @param opaque fields that are not looked into
 */
export function shapeOf(view: unknown, opaque: Opaque = []): string[] {
  return [...new Set(fieldsOf(view, "", opaque))].sort();
}

function fieldsOf(value: unknown, path: string, opaque: Opaque): string[] {
  if (opaque.includes(path)) return [path];
  if (Array.isArray(value)) return value.flatMap((member) => fieldsOf(member, `${path}[]`, opaque));
  if (typeof value !== "object" || value === null) return [path];
  return Object.entries(value).flatMap(([name, member]) => fieldsOf(member, path ? `${path}.${name}` : name, opaque));
}

/** A view is plain data: what a page gets over the wire is all there is, and no model, date or buffer is left in it. */
export function expectPlain(view: unknown): void {
  expect(view).toStrictEqual(JSON.parse(JSON.stringify(view)));
}
