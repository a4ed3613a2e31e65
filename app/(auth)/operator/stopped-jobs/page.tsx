import type { Metadata } from "next";
import { Empty } from "@/components/ui/Empty";
import { formatInstant } from "@/components/ui/formatDay";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requirePerson } from "@/lib/auth/requirePerson";
import { listStoppedJobs } from "@/lib/queries/listStoppedJobs";
import { ActOnJob } from "./_components/ActOnJob";
import { actOnJobAction } from "./actions";

export const metadata: Metadata = { title: "Stopped jobs" };

export default async function StoppedJobsPage() {
  const jobs = await orNotFound(listStoppedJobs(await requirePerson()));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Stopped jobs</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        Tried as often as they may be. Somebody may be waiting. The log has each under its reference.
      </p>
      <div className="mt-6">
        {jobs.length === 0 ? (
          <Empty title="No job has stopped">A job comes here when its last try has failed.</Empty>
        ) : (
          <Table reflow caption="Stopped jobs">
            <thead>
              <tr>
                <Th>Reference</Th>
                <Th>Job</Th>
                <Th>About</Th>
                <Th>Stopped</Th>
                <Th figure>Tries</Th>
                <Th>Last fault</Th>
                <Th />
              </tr>
            </thead>
            <tbody>
              {jobs.map(({ id, job, subject, stoppedAt, tries, fault }) => (
                <Tr key={id}>
                  <RowHead>{id.slice(0, 8).toUpperCase()}</RowHead>
                  <Td label="Job">{job}</Td>
                  <Td label="About">
                    {subject.map((one) => (
                      <span key={one.what} className="block break-all">
                        {one.what} {one.id}
                      </span>
                    ))}
                  </Td>
                  <Td label="Stopped">{formatInstant(stoppedAt, { seconds: true })}</Td>
                  <Td label="Tries" figure>
                    {tries}
                  </Td>
                  <Td label="Last fault">{fault ?? "took longer than it may"}</Td>
                  <Td>
                    <ActOnJob jobId={id} action={actOnJobAction} />
                  </Td>
                </Tr>
              ))}
            </tbody>
          </Table>
        )}
      </div>
    </div>
  );
}
