import "server-only";
import { requireAfresh } from "@/lib/policies/requireAfresh";
import { ConflictError, InvalidError } from "@/lib/errors";
import { webEnv } from "@/lib/env";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { can } from "@/lib/policies/can";
import { standingActs, type StandingAct } from "@/lib/policies/standing";
import { Person, Standing } from "@/models";
import { lockOwnCertificate } from "./lockOwn";
import { transact } from "./transact";
import { writeMail } from "./writeMail";

type Act = { number: string; act: StandingAct; ground: string; reason: string; group: string };

/**
 * Suspend, reinstate or withdraw a certificate, signing in afresh.
 * @param group the second group of the number, typed by hand: a slip of the row must not cut the wrong certificate
 */
export const setStanding = (actor: Actor, { number, act, ground, reason, group }: Act, now = new Date()) =>
  transact(actor, async (transaction) => {
    const certificate = await lockOwnCertificate(actor, number, transaction);
    authorize(can.setStanding(actor, certificate), "change the standing of this certificate");
    requireAfresh(actor, now);
    const expected = number.split("-")[2]!;
    if (group.trim().toUpperCase() !== expected) {
      throw new InvalidError(`Type the second group of the number, ${expected}.`, { group: [`Type ${expected}.`] });
    }
    const where = { certificateId: certificate.id };
    const last = await Standing.findOne({ where, order: [["sequence", "DESC"]], transaction, rejectOnEmpty: true });
    const { from, to, done } = standingActs[act];
    if (!from.includes(last.standing))
      throw new ConflictError(`This certificate is ${last.standing}; it cannot be ${done}.`);
    await Standing.create(
      { ...where, sequence: last.sequence + 1, standing: to, ground, reason, setBy: actor.personId, setAt: now },
      { transaction },
    );
    const holder = await Person.findByPk(certificate.holderId, { transaction, rejectOnEmpty: true });
    await writeMail(
      {
        to: holder.email,
        subject: `Certificate ${number} is ${done}`,
        body: `The register's entry of your certificate ${number} is ${done} from now on.\n\nGround: ${ground}\n${reason}\n\n${to === "valid" ? "" : "Do not present it as valid. "}You may appeal within 30 days.\n${webEnv().PUBLIC_ORIGIN}/verify/${number}\n`,
      },
      transaction,
    );
    return { standing: to };
  });
