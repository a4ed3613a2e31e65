import Link from "next/link";
import { StandingGlyph } from "@/components/certificates/StandingGlyph";
import { ValidityLine } from "@/components/certificates/ValidityLine";
import { ChipStrip } from "@/components/ui/ChipStrip";
import { formatDay, formatInstant } from "@/components/ui/formatDay";
import { Glyph } from "@/components/ui/Glyph";
import { Ledger } from "@/components/ui/Ledger";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { StatusHead, type Standing } from "@/components/ui/StatusHead";
import type { PublicVerification } from "@/lib/queries/getPublicVerification";
import type { PublicVerificationRecord } from "@/lib/queries/getPublicVerificationRecord";
import { MeasuredQuantities } from "./MeasuredQuantities";
import { RegisterSentence } from "./RegisterSentence";
import { SUPERVISION_IN_WORDS } from "@/lib/certificates/supervision";
import { SaveRecord } from "./SaveRecord";

const HEADS: Record<PublicVerification["standing"], Standing> = {
  Valid: "valid",
  Suspended: "suspended",
  Withdrawn: "withdrawn",
  Superseded: "superseded",
  Expired: "expired",
  "Not yet valid": "not-yet-valid",
};

type RegisterAnswerProps = { entry: PublicVerification; record: PublicVerificationRecord | null };

/** The register's entry as the public may see it: answer first, evidence beside it. */
export function RegisterAnswer({ entry, record }: RegisterAnswerProps) {
  const broken = ["Suspended", "Withdrawn", "Superseded"].includes(entry.standing) ? entry.standingSince : null;
  return (
    <div className="desk:grid desk:min-h-full desk:grid-cols-[56fr_44fr]">
      <section className="bg-sheet px-(--margin) py-8 desk:py-9">
        <StatusHead standing={HEADS[entry.standing]} />
        <RegisterSentence entry={entry} />
        <div className="mt-7">
          <ValidityLine
            effectiveOn={entry.effectiveOn}
            lastDay={entry.lastDay}
            today={entry.today}
            brokenOn={broken}
            brokenWord={entry.standing}
          />
        </div>
        {entry.demonstration && (
          <Notice tone="caution" fact="Demonstration." className="mt-6">
            This certificate was issued by a demonstration and says nothing about a real person.
          </Notice>
        )}
        <Ledger className="mt-8" rows={facts(entry)} />
        <MeasuredQuantities quantities={entry.quantities} />
        <ul className="mt-8 grid gap-1 text-dense text-ink-2">
          {entry.cautions.map((caution) => (
            <li key={caution}>{caution}</li>
          ))}
        </ul>
      </section>
      <section className="px-(--margin) py-8 desk:border-l-hair desk:border-rule-strong desk:py-9">
        <h2 className="text-h2">Compare with the paper</h2>
        <p className="mt-1 max-w-measure text-dense text-ink-2">
          Name, module, number and every chip must agree. If one differs, do not rely on the paper. A forger can copy a
          strip: the register and the signature decide.
        </p>
        <div className="mt-5 border-hair border-rule bg-sheet p-5">
          <ChipStrip fingerprint={entry.fingerprint} />
          <div className="mt-5 flex flex-wrap items-center justify-between gap-4 border-t-hair border-rule pt-4">
            <span className="font-code text-[1.35rem] font-semibold">{entry.number}</span>
            <StandingGlyph standing={entry.standing} />
          </div>
        </div>
        <ul className="mt-6 border-t-hair border-rule">
          <Told within={entry.standing === "Valid"} fact={`The register says: ${entry.standing}`}>
            Read from the register {formatInstant(entry.readAt, { seconds: true })}
          </Told>
          <Told within fact="The register holds the signed file">
            <span className="break-all">
              SHA-256 of the file <code className="font-code text-[0.8125rem]">{entry.pdfSha256}</code>
            </span>
          </Told>
        </ul>
        <div className="mt-6 flex flex-wrap gap-3">
          <LinkKey href="/verify#file-head" variant="filled">
            Verify the PDF file
          </LinkKey>
          <LinkKey href="/verify">Verify another number</LinkKey>
        </div>
        <div className="mt-4">
          <SaveRecord number={entry.number} record={record} />
        </div>
        <p className="mt-4 text-label font-normal text-ink-2">
          Only the file can show that its signature is genuine.{" "}
          <Link className="link" href="/trust">
            Verify it off line
          </Link>
          .
        </p>
      </section>
    </div>
  );
}

function Told({ within, fact, children }: { within: boolean; fact: string; children: React.ReactNode }) {
  return (
    <li className="flex gap-3 border-b-hair border-rule py-3">
      <Glyph name={within ? "within" : "outside"} />
      <div className="min-w-0">
        <p className="font-semibold">{fact}</p>
        <p className="text-dense text-ink-2">{children}</p>
      </div>
    </li>
  );
}

const facts = (entry: PublicVerification) => [
  { label: "Holder", value: entry.holder, detail: identity(entry) },
  {
    label: "Competence",
    value: `${entry.scheme.code} ${entry.scheme.title}`,
    detail: `Release ${entry.release.number}`,
  },
  { label: "Scope", value: entry.scope },
  { label: "Limits", value: entry.limits },
  { label: "Issuer", value: entry.issuer.name, detail: entry.issuer.standing },
  { label: "Scheme", value: entry.scheme.edition },
  { label: "Sat", value: SUPERVISION_IN_WORDS[entry.supervision] },
  {
    label: "Decided by",
    value: "A decider",
    detail: entry.decided.outsideLine ? "Outside the candidate’s line" : "Within the candidate’s own line",
  },
  { label: "Decided", value: formatDay(entry.decided.at), detail: `Standing since ${formatDay(entry.standingSince)}` },
];

const identity = ({ identity }: PublicVerification) =>
  identity ? `Identity confirmed by ${identity.byRole}` : "Identity not confirmed by a person";
