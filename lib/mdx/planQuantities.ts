import type { CheckKind, CheckPlan, QuantityDefinition } from "@/lib/checks/kind";
import { planTolerance } from "@/lib/mdx/planTolerance";
import { problemAt, warningAt, type Problem } from "@/lib/mdx/problem";
import { partsOf, plainAttribute, rangeOfAttribute, type WrittenCheck, type WrittenTag } from "@/lib/mdx/writtenTag";

type PlannedQuantity = CheckPlan["quantities"][number];

/** The quantities named inside a check, in the order of the kind; all of the kind's when none is named. */
export function planQuantities(
  kind: CheckKind,
  check: WrittenCheck,
): { quantities: PlannedQuantity[]; problems: Problem[] } {
  const problems: Problem[] = [];
  for (const { tag, range } of check.parts) {
    if (tag !== "Quantity") problems.push(problemAt(range, "quantity", `<${tag}> ${OWN}`));
  }
  const tags = partsOf(check, "Quantity");
  if (tags.length === 0) return { quantities: kind.quantities.map(asDefined), problems };
  const named = new Map<string, WrittenTag>();
  for (const tag of tags) {
    problems.push(...attributeProblems(tag));
    const of = plainAttribute(tag, "Quantity", "of");
    if (typeof of !== "string") continue;
    const at = rangeOfAttribute(tag, "of");
    if (!kind.quantities.some(({ id }) => id === of)) {
      const known = kind.quantities.map(({ id }) => id).join(", ");
      problems.push(problemAt(at, "quantity", `"${of}" is not a quantity of kind "${kind.id}". It has ${known}.`));
    } else if (named.has(of)) {
      problems.push(problemAt(at, "quantity", `"${of}" is named twice in this check. Delete one.`));
    } else named.set(of, tag);
  }
  const quantities = kind.quantities.flatMap((definition): PlannedQuantity[] => {
    const tag = named.get(definition.id);
    if (tag) return [planned(definition, tag, problems)];
    if (definition.critical) {
      const message = `"${definition.id}" is critical in this kind and is not named here, so it would not be judged. Name it, or name no quantity to have all of them.`;
      problems.push(warningAt(check.range, "quantity", message));
    }
    return [];
  });
  return { quantities, problems };
}

const OWN = 'belongs to checks of kind "formula". Delete it, or choose that kind.';

/** A quantity of the catalogue is named by `of`; what a lead writes about an own quantity stands in its kind already. */
function attributeProblems(tag: WrittenTag): Problem[] {
  const own = tag.attributes.filter(({ name }) => ["id", "label", "unit", "answer"].includes(name));
  const problems = own.map(({ name, range }) => problemAt(range, "attribute", `${name} ${OWN}`));
  if (tag.attributes.some(({ name }) => name === "of")) return problems;
  return [...problems, problemAt(tag.range, "attribute", '<Quantity> needs of. Write, for instance, of="doppler".')];
}

const asDefined = ({ id, tolerance, critical }: QuantityDefinition): PlannedQuantity => ({
  of: id,
  tolerance,
  critical,
});

function planned(definition: QuantityDefinition, tag: WrittenTag, problems: Problem[]): PlannedQuantity {
  const critical = plainAttribute(tag, "Quantity", "critical");
  const written = plainAttribute(tag, "Quantity", "tolerance");
  const quantity = asDefined(definition);
  if (typeof critical === "boolean") quantity.critical = critical;
  if (typeof written === "string") {
    const read = planTolerance(definition, written, rangeOfAttribute(tag, "tolerance"));
    if ("tolerance" in read) quantity.tolerance = read.tolerance;
    else problems.push(read.problem);
  }
  return quantity;
}
