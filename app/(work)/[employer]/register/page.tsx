import type { Metadata } from "next";
import { CertificateTable } from "@/components/certificates/CertificateTable";
import { Empty } from "@/components/ui/Empty";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { listRegister } from "@/lib/queries/listCertificates";

export const metadata: Metadata = { title: "Register" };

export default async function RegisterPage({ params }: { params: Promise<{ employer: string }> }) {
  const { employer } = await params;
  const rows = await orNotFound(listRegister(await requireActor(employer)));
  return (
    <div className="page py-8 desk:py-10">
      <h1 className="text-h1">Register</h1>
      <p className="mt-2 max-w-measure text-lead text-ink-2">
        What the firm has issued. Open an entry to suspend, reinstate or withdraw it.
      </p>
      <div className="mt-6">
        {rows.length > 0 ? (
          <CertificateTable rows={rows} base={`/${employer}/register`} showHolder />
        ) : (
          <Empty title="The register is empty">The first entry comes with the first decision of competent.</Empty>
        )}
      </div>
    </div>
  );
}
