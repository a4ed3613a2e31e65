import "server-only";
import { dayIn } from "@/lib/calendar";
import { InvalidError } from "@/lib/errors";
import type { Actor } from "@/lib/policies/actor";
import { authorize } from "@/lib/policies/authorize";
import { canPeople } from "@/lib/policies/people";
import { Employer, Training } from "@/models";
import { lockPerson } from "./lockPerson";
import { transact } from "./transact";

type Trained = { technicianId: string; trainerId: string; endedOn: string };

/** Record who trained a person, and when it ended: the trainer may not decide on that person for two years. */
export const recordTraining = (actor: Actor, { technicianId, trainerId, endedOn }: Trained, now = new Date()) =>
  transact(actor, async (transaction) => {
    authorize(canPeople.recordTraining(actor), "record trainings");
    if (technicianId === trainerId) refuse("trainerId", "Nobody trains oneself.");
    // Always in the same order, so that two records about the same two people cannot wait for each other for ever.
    for (const personId of [technicianId, trainerId].sort()) await lockPerson(actor, personId, transaction);
    const { employerId, personId: recordedBy } = actor;
    const employer = await Employer.findByPk(employerId, { transaction, rejectOnEmpty: true });
    if (endedOn > dayIn(employer.timeZone, now)) refuse("endedOn", "The day is still to come.");
    await Training.create(
      { employerId, technicianId, trainerId, endedOn, recordedBy, recordedAt: now },
      { transaction },
    );
  });

function refuse(field: string, sentence: string): never {
  throw new InvalidError(sentence, { [field]: [sentence] });
}
