import "server-only";
import type { Transaction } from "sequelize";
import { select } from "@/lib/db";
import type { DecidableCase } from "@/lib/policies/decidability";
import { isSittingComplete } from "@/lib/policies/isSittingComplete";
import { requirementMet } from "@/lib/policies/requirement";
import { Certificate, Decision, type Person } from "@/models";
import type { FoundCase } from "./findCase";
import { freeDeciders } from "./freeDeciders";
import { tellDeciders } from "./tellDeciders";
import { writeMail } from "./writeMail";

type Again = Pick<FoundCase, "sitting" | "release" | "employer"> & { technician: Person };
type Told = { publicOrigin: string; now: Date };

/**
 * What follows from a record that was marked again is the decider's act: told where a certificate no longer has its
 * requirement met, where a sitting decided not yet competent would now have it met, and where an undecided one is complete.
 */
export async function tellMarkedAgain(again: Again, told: Told, transaction: Transaction): Promise<void> {
  const { sitting, release, employer, technician } = again;
  const cases = await select<DecidableCase & { number: number }>(CASES, { sittingId: sitting.id }, transaction);
  const decision = await Decision.findOne({ where: { sittingId: sitting.id }, transaction });
  if (!decision) {
    const why = "A corrected marking was applied to it.";
    if (isSittingComplete(release.checks, release.frontMatter.sitting, cases))
      await tellDeciders(again, { ...told, why }, transaction);
    return;
  }
  const metIds = new Set(cases.filter(({ met }) => met).map(({ checkId }) => checkId));
  const isMet = requirementMet(release.frontMatter.require, metIds);
  if (isMet === (decision.outcome === "competent")) return;
  const attributes = ["number"];
  const certificate = await Certificate.findOne({ where: { sittingId: sitting.id }, attributes, transaction });
  const page = certificate ? `register/${certificate.number}` : `queue/${sitting.id}`;
  const [subject, says] = isMet
    ? [
        "Would now meet the requirement",
        "was decided not yet competent. By the corrected marking it now meets the requirement of its release. The decision stands as it was signed; a new sitting can be assigned.",
      ]
    : [
        certificate ? "Certificate to review" : "Decision to review",
        `was decided competent${certificate ? `, certificate ${certificate.number}` : ""}. By the corrected marking it no longer meets the requirement of its release. Whether the certificate stands is for you to say.`,
      ];
  const body = `Sitting S-${sitting.number} of ${technician.name} on "${release.title}", release ${release.number}, ${says}\n\n${told.publicOrigin}/${employer.slug}/${page}\n`;
  for (const to of await freeDeciders({ sitting, employer }, told.now, transaction)) {
    await writeMail({ to, subject: `${subject}: ${technician.name}, ${release.title}`, body }, transaction);
  }
}

const CASES = `SELECT check_id AS "checkId", number, state, met FROM case_states WHERE sitting_id = :sittingId`;
