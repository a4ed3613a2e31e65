import type { Metadata } from "next";
import { CertificateFacts, StandingHistory } from "@/components/certificates/CertificateFacts";
import { StandingGlyph } from "@/components/certificates/StandingGlyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { WorkBar } from "@/components/ui/WorkBar";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getCertificate } from "@/lib/queries/getCertificate";

export const metadata: Metadata = { title: "Certificate" };

export default async function CertificatePage({ params }: { params: Promise<{ employer: string; number: string }> }) {
  const { employer, number } = await params;
  const certificate = await orNotFound(getCertificate(await requireActor(employer), number));
  return (
    <>
      <WorkBar
        eyebrow={`Certificate ${certificate.number}`}
        title={`${certificate.record.holder.name}, ${certificate.record.scheme.title}`}
        keys={
          <>
            <LinkKey
              href={`/api/employers/${employer}/certificates/${number}/pdf`}
              variant="filled"
              download={`${number}.pdf`}
            >
              Save the signed PDF
            </LinkKey>
            <LinkKey href={`/verify/${number}`}>See what anyone sees</LinkKey>
          </>
        }
      >
        <StandingGlyph standing={certificate.shown} />
      </WorkBar>
      <div className="page grid gap-x-14 gap-y-10 py-8 desk:grid-cols-[2fr_1fr]">
        <div>
          <CertificateFacts certificate={certificate} />
        </div>
        <StandingHistory certificate={certificate} />
      </div>
    </>
  );
}
