import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { Ledger } from "@/components/ui/Ledger";
import { SectionHead } from "@/components/ui/SectionHead";
import type { CertificateView } from "@/lib/queries/getCertificate";

/** What a certificate says, for the holder and the issuer's own people. */
export function CertificateFacts({ certificate }: { certificate: CertificateView }) {
  const { record } = certificate;
  return (
    <>
      <Ledger
        rows={[
          {
            label: "Holder",
            value: record.holder.name,
            detail: record.identity ? undefined : "Identity not confirmed by a person",
          },
          {
            label: "Competence",
            value: `${record.scheme.code} ${record.scheme.title}`,
            detail: `Release ${record.release.number}`,
          },
          { label: "Scope", value: record.scope },
          { label: "Limits", value: record.limits },
          { label: "Effective", value: formatDay(record.effectiveOn), detail: `Last day ${formatDay(record.lastDay)}` },
          {
            label: "Decided by",
            value: record.decided.by,
            detail: record.decided.outsideLine ? "Outside the candidate’s line" : "Within the candidate’s own line",
          },
          { label: "Decided", value: formatInstant(record.decided.at), detail: "Signed in afresh" },
        ]}
      />
      <div className="mt-6 max-w-[520px] border-hair border-rule bg-sheet p-5">
        <ChipStrip fingerprint={certificate.fingerprint} />
        <p className="mt-3 break-all font-code text-[0.8125rem] text-ink-2">{certificate.fingerprint}</p>
      </div>
    </>
  );
}

/** Every change of standing, oldest first; nothing in it is ever edited. */
export function StandingHistory({ certificate }: { certificate: CertificateView }) {
  return (
    <section aria-labelledby="history">
      <SectionHead title="Standing" id="history" />
      <ol>
        {certificate.history.map((one) => (
          <li key={one.setAt} className="border-b-hair border-rule py-3 text-dense">
            <p>
              <strong className="font-semibold">{one.standing[0]!.toUpperCase() + one.standing.slice(1)}</strong>,{" "}
              {one.ground}
            </p>
            {one.reason && <p className="whitespace-pre-line">{one.reason}</p>}
            <p className="text-ink-2">
              {one.setBy}, {formatInstant(one.setAt, { seconds: true })}
            </p>
          </li>
        ))}
      </ol>
    </section>
  );
}
