import { quantitiesOf } from "@/lib/checks/definitionsOf";
import { formatUnderstood } from "@/lib/checks/formatUnderstood";
import type { CheckKind, CheckPlan, QuantityDefinition } from "@/lib/checks/kind";
import { KINDS } from "@/lib/checks/registry";

/** What is said of a check before its case is opened. Plain strings, ready for the card. */
export type CheckCardView = {
  id: string;
  title: string;
  minutes: number;
  needs: number;
  quantities: { id: string; label: string; tolerance: string; critical: boolean }[];
};

/** By check id, for the `<Check>` elements of a module's tree. The words are those of the version that the plan names. */
export function checkCards(
  plans: readonly CheckPlan[],
  kinds: readonly CheckKind[] = KINDS,
): Record<string, CheckCardView> {
  return Object.fromEntries(plans.map((plan) => [plan.id, cardOf(plan, kinds)]));
}

function cardOf(plan: CheckPlan, kinds: readonly CheckKind[]): CheckCardView {
  const kind = kinds.find(({ id, version }) => id === plan.kind && version === plan.version);
  const definitions = kind ? quantitiesOf(kind, plan) : [];
  const quantities = plan.quantities.map((planned) => {
    const definition = definitions.find(({ id }) => id === planned.of);
    return {
      id: planned.of,
      label: definition?.label ?? planned.of,
      tolerance: toleranceText(planned, definition, kind?.judged ?? false),
      critical: planned.critical,
    };
  });
  const { id, title, minutes } = plan;
  return { id, title, minutes, needs: plan.needs ?? quantities.length, quantities };
}

function toleranceText(
  { tolerance }: CheckPlan["quantities"][number],
  definition: QuantityDefinition | undefined,
  judged: boolean,
): string {
  if (judged) return "judged by an assessor";
  if (tolerance) return `±${formatUnderstood(tolerance.value, tolerance.unit)}`;
  // A number without a tolerance of its own is judged by what the kind works out from the hand-in.
  return definition && definition.unit !== null ? definition.reason : "exact";
}
