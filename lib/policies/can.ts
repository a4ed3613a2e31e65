import type { Actor, Role } from "./actor";

type Owned = { employerId: string };
type Persons = Owned & { technicianId: string };
type Held = Owned & { holderId: string };

const holds = (actor: Actor, employerId: string, ...roles: Role[]): boolean =>
  actor.employerId === employerId && roles.some((role) => actor.roles.includes(role));

const isTheTechnician = (actor: Actor, record: Persons): boolean =>
  actor.personId === record.technicianId && actor.employerId === record.employerId;

/** Who may do what: facts in, yes or no out. Separation of duties per candidate is in separation.ts. */
export const can = {
  readModules: (actor: Actor, module: Owned) => holds(actor, module.employerId, "lead", "administrator"),
  writeModule: (actor: Actor, module: Owned) => holds(actor, module.employerId, "lead"),
  releaseModule: (actor: Actor, module: Owned) => holds(actor, module.employerId, "lead"),
  assignRelease: (actor: Actor, release: Owned) => holds(actor, release.employerId, "lead"),
  readFees: (actor: Actor, fee: Owned) => holds(actor, fee.employerId, "administrator"),
  payFees: (actor: Actor, fee: Owned) => holds(actor, fee.employerId, "administrator"),
  sit: (actor: Actor, assignment: Persons) =>
    isTheTechnician(actor, assignment) && holds(actor, assignment.employerId, "technician"),
  /** A person keeps the own sittings and records after the role has ended. */
  readSitting: (actor: Actor, sitting: Persons) =>
    isTheTechnician(actor, sitting) || holds(actor, sitting.employerId, "lead", "administrator", "assessor", "decider"),
  /** Answers and workings: the person, who decides, who assesses, who wrote the check; not the people who pay. */
  readRecord: (actor: Actor, sitting: Persons) =>
    isTheTechnician(actor, sitting) || holds(actor, sitting.employerId, "lead", "assessor", "decider"),
  /** Few sittings are few people: how they did is read by who wrote the checks, as their records are. */
  readStatistics: (actor: Actor, release: Owned) => holds(actor, release.employerId, "lead"),
  reviewMarkings: (actor: Actor, employer: Owned) => holds(actor, employer.employerId, "lead"),
  readQueue: (actor: Actor, sitting: Owned) => holds(actor, sitting.employerId, "assessor", "decider"),
  /** Whoever sat a case neither judges it nor answers the own question. */
  judge: (actor: Actor, sitting: Persons) =>
    holds(actor, sitting.employerId, "assessor") && actor.personId !== sitting.technicianId,
  answerQuestion: (actor: Actor, sitting: Persons) =>
    holds(actor, sitting.employerId, "assessor") && actor.personId !== sitting.technicianId,
  decide: (actor: Actor, sitting: Owned) => holds(actor, sitting.employerId, "decider"),
  /** Never of the own certificate: nobody decides in an own matter. */
  setStanding: (actor: Actor, certificate: Held) =>
    holds(actor, certificate.employerId, "decider") && actor.personId !== certificate.holderId,
  readCertificate: (actor: Actor, certificate: Held) =>
    actor.personId === certificate.holderId ||
    holds(actor, certificate.employerId, "lead", "administrator", "assessor", "decider"),
  readTrail: (actor: Actor, employer: Owned) => holds(actor, employer.employerId, "administrator"),
} as const;
