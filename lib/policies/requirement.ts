/** What a release asks for: all of these checks, and at least so many of those. */
export type Requirement = { all: readonly string[]; some?: { of: readonly string[]; count: number } | null };

export function requirementMet(require: Requirement, metCheckIds: ReadonlySet<string>): boolean {
  const all = require.all.every((id) => metCheckIds.has(id));
  const some = require.some?.of.filter((id) => metCheckIds.has(id)).length ?? 0;
  return all && some >= (require.some?.count ?? 0);
}
