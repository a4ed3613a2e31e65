import type { Metadata } from "next";
import { CertificateTable } from "@/components/certificates/CertificateTable";
import { Empty } from "@/components/ui/Empty";
import { SectionHead } from "@/components/ui/SectionHead";
import { requireActor } from "@/lib/auth/requireActor";
import { listCertificates, listOwnCertificates } from "@/lib/queries/listCertificates";

export const metadata: Metadata = { title: "Certificates" };

export default async function CertificatesPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const actor = await requireActor(employer);
  const own = await listOwnCertificates(actor);
  const issues = actor.roles.some((role) => role !== "technician");
  const issued = issues ? await listCertificates(actor) : [];
  const base = `/${employer}/certificates`;
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Certificates</h1>
      {(own.length > 0 || actor.roles.includes("technician")) && (
        <section className="mt-6" aria-labelledby="own">
          {issues && <SectionHead title="Yours" id="own" note="They stay yours when you leave" />}
          {own.length > 0 ? (
            <CertificateTable rows={own} base={base} />
          ) : (
            <Empty title="No certificate yet">
              One is issued when a sitting of yours is decided competent. It stays yours when you leave.
            </Empty>
          )}
        </section>
      )}
      {issues && (
        <section className="mt-8" aria-labelledby="issued">
          <SectionHead title={`Issued by ${actor.employerName}`} id="issued" />
          {issued.length > 0 ? (
            <CertificateTable rows={issued} base={base} showHolder />
          ) : (
            <Empty title="None issued yet">A certificate is issued when a sitting is decided competent.</Empty>
          )}
        </section>
      )}
    </div>
  );
}
