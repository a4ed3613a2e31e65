import type { Metadata } from "next";
import { formatDay } from "@/components/ui/formatDay";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listPeople, type PeopleView } from "@/lib/queries/listPeople";
import { AddPersonForm } from "./_components/AddPersonForm";
import { GrantRoleForm } from "./_components/GrantRoleForm";
import { HeldRoles } from "./_components/HeldRoles";
import { RecordTrainingForm } from "./_components/RecordTrainingForm";
import { addPersonAction, endRoleAction, grantRoleAction, recordTrainingAction } from "./actions";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const view = await orNotFound(listPeople(await requireActor(employer)));
  const { people, trainings, may } = view;
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">People</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        Who does what at the firm. A role that is ended is refused at the next request made with it.
      </p>
      <div className="mt-8 grid gap-x-(--gutter) gap-y-10 desk:grid-cols-[8fr_4fr]">
        <div className="grid min-w-0 content-start gap-10">
          <section aria-labelledby="roles">
            <SectionHead title="Roles" id="roles" note={`${people.length} people`} />
            <Roles employer={employer} view={view} />
          </section>
          <section aria-labelledby="trainings">
            <SectionHead title="Trainings" id="trainings" note="who trained does not decide, for two years" />
            <Trainings trainings={trainings} />
          </section>
        </div>
        <div className="grid content-start gap-10">
          {may.add && <AddPersonForm employer={employer} action={addPersonAction} />}
          {may.recordTraining && (
            <RecordTrainingForm
              employer={employer}
              people={people.map(({ id, name, roles }) => ({
                id,
                name,
                isTechnician: roles.some(({ role }) => role === "technician"),
              }))}
              action={recordTrainingAction}
            />
          )}
        </div>
      </div>
    </div>
  );
}

function Roles({ employer, view: { people, may } }: { employer: string; view: PeopleView }) {
  return (
    <ul>
      {people.map((person) => (
        <li
          key={person.id}
          className="grid gap-x-6 gap-y-3 border-b-hair border-rule py-4 tablet:grid-cols-[5fr_4fr_3fr] tablet:py-3"
        >
          <div className="min-w-0">
            <h3 className="font-text text-body font-semibold tracking-normal">{person.name}</h3>
            <p className="text-dense text-ink-2">{person.email}</p>
          </div>
          <HeldRoles
            employer={employer}
            person={person.name}
            roles={person.roles}
            end={may.endRole ? endRoleAction : null}
          />
          {may.grantRole && (
            <GrantRoleForm
              employer={employer}
              personId={person.id}
              person={person.name}
              held={person.roles.map(({ role }) => role)}
              action={grantRoleAction}
            />
          )}
        </li>
      ))}
    </ul>
  );
}

function Trainings({ trainings }: Pick<PeopleView, "trainings">) {
  if (trainings.length === 0) return <p className="mt-3 text-ink-2">No training is recorded.</p>;
  return (
    <Table reflow caption="Recorded trainings">
      <thead>
        <tr>
          <Th>Technician</Th>
          <Th>Trained by</Th>
          <Th>Ended</Th>
          <Th>Recorded by</Th>
        </tr>
      </thead>
      <tbody>
        {trainings.map((training) => (
          <Tr key={training.id}>
            <RowHead>{training.technician}</RowHead>
            <Td label="Trained by">{training.trainer}</Td>
            <Td label="Ended">{formatDay(training.endedOn)}</Td>
            <Td label="Recorded by">{training.recordedBy}</Td>
          </Tr>
        ))}
      </tbody>
    </Table>
  );
}
