import Link from "next/link";
import type { Metadata } from "next";
import { StandingGlyph } from "@/components/certificates/StandingGlyph";
import { SittingStateWord } from "@/components/sittings/SittingStateWord";
import { sittingAddress } from "@/components/sittings/SittingTable";
import { Empty } from "@/components/ui/Empty";
import { formatDay } from "@/components/ui/formatDay";
import { LinkKey } from "@/components/ui/LinkKey";
import { SectionHead } from "@/components/ui/SectionHead";
import { requireActor } from "@/lib/auth/requireActor";
import { listOwnCertificates } from "@/lib/queries/listCertificates";
import { listOwnSittings, type SittingRow } from "@/lib/queries/listSittings";

export const metadata: Metadata = { title: "Desk" };

const OVER: readonly SittingRow["state"][] = ["certificate issued", "not yet competent"];

export default async function DeskPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const actor = await requireActor(employer);
  const [sittings, certificates] = await Promise.all([listOwnSittings(actor), listOwnCertificates(actor)]);
  const open = sittings.filter((row) => !OVER.includes(row.state));
  return (
    <div className="page py-8 desk:py-10">
      <p className="text-label font-normal text-ink-2">{actor.employerName}</p>
      <h1 className="text-h1">Desk</h1>
      <div className="mt-6 grid gap-x-14 gap-y-10 desk:grid-cols-[2fr_1fr]">
        <section aria-labelledby="todo">
          <SectionHead title="To do" id="todo" />
          {open.length === 0 && (
            <div className="mt-4">
              <Empty title="Nothing waits for you" action={<LinkKey href="/bench">Open the bench</LinkKey>} level={3}>
                You are mailed when a module is assigned to you.
              </Empty>
            </div>
          )}
          <ul>
            {open.map((row) => (
              <li
                key={row.assignmentId}
                className="grid gap-3 border-b-hair border-rule py-5 tablet:grid-cols-[1fr_auto]"
              >
                <div>
                  <h3 className="text-h3">
                    {row.code} {row.title}
                  </h3>
                  <p className="mt-1 text-dense text-ink-2">
                    {row.lastDay ? `Last day ${formatDay(row.lastDay)}` : `Sit it by ${formatDay(row.dueOn)}`}.{" "}
                    {row.met} of {row.checks} checks met.
                  </p>
                  <p className="mt-2 text-dense">
                    <SittingStateWord state={row.state} />
                  </p>
                </div>
                <div>
                  <LinkKey href={sittingAddress(employer, row)} variant={row === open[0] ? "filled" : undefined}>
                    {NEXT[row.state]}
                  </LinkKey>
                </div>
              </li>
            ))}
          </ul>
        </section>
        <section aria-labelledby="held">
          <SectionHead title="Certificates" id="held" />
          {certificates.length === 0 && <p className="mt-3 text-dense text-ink-2">None yet.</p>}
          <ul>
            {certificates.map((row) => (
              <li key={row.number} className="border-b-hair border-rule py-3">
                <Link className="link font-semibold" href={`/${employer}/certificates/${row.number}`}>
                  {row.code} {row.title}
                </Link>
                <p className="mt-1 flex flex-wrap justify-between gap-3 text-dense">
                  <StandingGlyph standing={row.standing} daysLeft={row.daysLeft} />
                  <span className="text-ink-2">until {formatDay(row.lastDay)}</span>
                </p>
              </li>
            ))}
          </ul>
        </section>
      </div>
    </div>
  );
}

const NEXT: Record<SittingRow["state"], string> = {
  "fee open": "Read the module",
  "not started": "Read and start",
  sitting: "Go on",
  "for decision": "Open the sitting",
  issuing: "Open the sitting",
  "certificate issued": "Open the sitting",
  "not yet competent": "Open the sitting",
};
