import type { Metadata } from "next";
import { CertificateFacts, StandingHistory } from "@/components/certificates/CertificateFacts";
import { StandingGlyph } from "@/components/certificates/StandingGlyph";
import { LinkKey } from "@/components/ui/LinkKey";
import { WorkBar } from "@/components/ui/WorkBar";
import { confirmPasswordAction } from "@/lib/auth/actions";
import { orNotFound } from "@/lib/auth/orNotFound";
import { requireActor } from "@/lib/auth/requireActor";
import { getRegisterEntry } from "@/lib/queries/getCertificate";
import { StandingForm } from "./_components/StandingForm";
import { setStandingAction } from "./actions";

export const metadata: Metadata = { title: "Register entry" };

export default async function RegisterEntryPage({ params }: { params: Promise<{ employer: string; number: string }> }) {
  const { employer, number } = await params;
  const certificate = await orNotFound(getRegisterEntry(await requireActor(employer), number));
  return (
    <>
      <WorkBar
        eyebrow={`Register entry ${certificate.number}`}
        title={`${certificate.record.holder.name}, ${certificate.record.scheme.title}`}
        keys={
          <>
            <LinkKey href={`/api/employers/${employer}/certificates/${number}/pdf`} download={`${number}.pdf`}>
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
        <div className="grid content-start gap-8">
          <StandingHistory certificate={certificate} />
          {certificate.maySetStanding && (
            <StandingForm
              employer={employer}
              number={number}
              holder={certificate.record.holder.name}
              title={certificate.record.scheme.title}
              stored={certificate.stored}
              setStanding={setStandingAction}
              confirmPassword={confirmPasswordAction}
            />
          )}
        </div>
      </div>
    </>
  );
}
