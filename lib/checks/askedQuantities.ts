import { convert, type Unit } from "@/lib/gnss/units";
import type { CheckPlan, Choice, QuantityDefinition } from "./kind";

/** A quantity as this plan asks it: the release's own tolerance and critical mark take the place of the kind's. */
export type AskedQuantity = {
  id: string;
  label: string;
  unit: Unit | null;
  choices: readonly Choice[];
  /** In `unit`, or in the unit of the kind's default where that is relative (%); NaN where there is none. */
  tolerance: number;
  critical: boolean;
  reason: string;
};

export type AskedQuantities = ReadonlyMap<string, AskedQuantity>;

/**
 * The quantities a plan asks, in the kind's order. A plan that names none asks all.
 * @throws RangeError for a quantity or a tolerance that the release check should have refused
 */
export function askedQuantities(definitions: readonly QuantityDefinition[], plan: CheckPlan): AskedQuantities {
  const named = new Map(plan.quantities.map((quantity) => [quantity.of, quantity]));
  for (const id of named.keys()) {
    if (!definitions.some((definition) => definition.id === id)) {
      throw new RangeError(`askedQuantities: ${plan.kind} has no quantity ${id}`);
    }
  }
  const asked = definitions.filter((definition) => named.size === 0 || named.has(definition.id));
  return new Map(asked.map((definition) => [definition.id, askedQuantity(definition, named.get(definition.id))]));
}

function askedQuantity(definition: QuantityDefinition, named?: CheckPlan["quantities"][number]): AskedQuantity {
  return {
    id: definition.id,
    label: definition.label,
    unit: definition.unit,
    choices: definition.choices ?? [],
    tolerance: toleranceOf(definition, named),
    critical: named ? named.critical : definition.critical,
    reason: definition.reason,
  };
}

function toleranceOf(definition: QuantityDefinition, named?: CheckPlan["quantities"][number]): number {
  if (!named?.tolerance) return definition.tolerance?.value ?? NaN;
  if (!definition.tolerance) throw new RangeError(`askedQuantities: ${definition.id} takes no tolerance`);
  const value = convert(named.tolerance.value, named.tolerance.unit, definition.tolerance.unit);
  const range = definition.toleranceRange;
  if (!range || !(value >= range.from && value <= range.to)) {
    throw new RangeError(`askedQuantities: tolerance of ${definition.id} is out of range, got ${value}`);
  }
  return value;
}
