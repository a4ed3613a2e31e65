import { wrongMethodsOf } from "@/lib/checks/definitionsOf";
import type { CheckKind, CheckPlan } from "@/lib/checks/kind";
import { leastNeeds, type LeastNeeds } from "@/lib/checks/leastNeeds";
import { LIMITS } from "@/lib/mdx/limits";
import { OWN_PLANS, type OwnPlan } from "@/lib/mdx/ownPlans";
import { planParameters } from "@/lib/mdx/planParameters";
import { planQuantities } from "@/lib/mdx/planQuantities";
import { problemAt, type Problem } from "@/lib/mdx/problem";
import { LANGUAGE_KINDS, TAGS } from "@/lib/mdx/tags";
import { plainAttribute, rangeOfAttribute, type WrittenCheck } from "@/lib/mdx/writtenTag";

export type PlanReading = { plans: CheckPlan[]; problems: Problem[] };

/** The checks of a module as a release stores them: every parameter and quantity filled in, with the version of its kind. */
export function planChecks(written: readonly WrittenCheck[], kinds: readonly CheckKind[]): PlanReading {
  const problems: Problem[] = [];
  const plans: CheckPlan[] = [];
  const ids = new Set<string>();
  for (const check of written) {
    const id = plainAttribute(check, "Check", "id");
    if (typeof id === "string" && ids.has(id)) {
      problems.push(
        problemAt(rangeOfAttribute(check, "id"), "check", `Two checks are named "${id}". Give this one another id.`),
      );
    }
    if (typeof id === "string") ids.add(id);
    const read = planCheck(check, kinds);
    problems.push(...read.problems);
    plans.push(...read.plans);
  }
  const surplus = written[LIMITS.checks];
  if (surplus)
    problems.push(
      problemAt(
        surplus.range,
        "check",
        `A module has at most ${LIMITS.checks} checks. Move the rest to another module.`,
      ),
    );
  return { plans, problems };
}

function planCheck(check: WrittenCheck, kinds: readonly CheckKind[]): PlanReading {
  const kindId = plainAttribute(check, "Check", "kind");
  if (typeof kindId !== "string") return { plans: [], problems: [] };
  const kind = kinds.find((one) => one.id === kindId);
  if (!kind)
    return { plans: [], problems: [problemAt(rangeOfAttribute(check, "kind"), "check", kindFault(kindId, kinds))] };

  const { title, parameters, quantities, problems } = inside(kind, check);
  const needs = plainAttribute(check, "Check", "needs");
  const count = quantities.length;
  if (typeof needs === "number" && needs > count && count > 0) {
    const message = `This check has ${count} ${count === 1 ? "quantity" : "quantities"}, so needs={${needs}} could never be met. Write ${count} or fewer.`;
    problems.push(problemAt(rangeOfAttribute(check, "needs"), "check", message));
  }
  const id = plainAttribute(check, "Check", "id");
  const minutes = plainAttribute(check, "Check", "minutes");
  const plan: CheckPlan = {
    id: typeof id === "string" ? id : "",
    kind: kind.id,
    version: kind.version,
    title,
    minutes: typeof minutes === "number" ? minutes : kind.defaultMinutes,
    needs: typeof needs === "number" ? needs : null,
    parameters,
    quantities,
  };
  const faulty = problems.some(({ severity }) => severity === "error");
  if (faulty && kind.ofPlan) return { plans: [], problems };
  const least = faulty ? null : leastNeeds({ wrongMethods: wrongMethodsOf(kind, plan) }, quantities);
  if (typeof needs === "number" && least && needs < least.needs) {
    problems.push(problemAt(rangeOfAttribute(check, "needs"), "check", tooFew(needs, least)));
  }
  return { plans: typeof id === "string" ? [plan] : [], problems };
}

/** What the attributes of the check and the tags inside it say, in the way of its kind. */
function inside(kind: CheckKind, check: WrittenCheck): OwnPlan {
  const own = new Set<string>(TAGS.Check.attributes.map(({ name }) => name));
  const written = check.attributes.filter(({ name }) => !own.has(name));
  const parameters = planParameters(kind, written, check.range);
  const planOwn = Object.hasOwn(OWN_PLANS, kind.id) ? OWN_PLANS[kind.id] : undefined;
  if (planOwn) {
    const planned = planOwn(check);
    return { ...planned, problems: [...parameters.problems, ...planned.problems] };
  }
  const { quantities, problems } = planQuantities(kind, check);
  return {
    title: kind.title,
    parameters: parameters.values,
    quantities,
    problems: [...parameters.problems, ...problems],
  };
}

function tooFew(needs: number, { needs: least, method, misses }: LeastNeeds): string {
  const names = misses.map((name) => `"${name}"`).join(" or ");
  return `With needs={${needs}} this check would be met by a known wrong method: ${method}. Write ${least} or more, or make ${names} critical.`;
}

function kindFault(id: string, kinds: readonly CheckKind[]): string {
  const known = `Kinds are ${kinds.map((kind) => kind.id).join(", ")}.`;
  if (LANGUAGE_KINDS.includes(id)) return `Checks of kind "${id}" are not available in this release. ${known}`;
  return `"${id}" is not a kind of check. ${known}`;
}
