import { Glyph } from "@/components/ui/Glyph";
import { SectionHead } from "@/components/ui/SectionHead";
import type { ReleaseCheckView } from "@/lib/queries/getReleaseCheck";
import { percentText } from "./percentText";

/** What the requirement comes to over a whole sitting, once every check has finished. */
export function SittingRate({ view }: { view: ReleaseCheckView }) {
  const { sitting, freshCases } = view;
  if (!sitting) return null;
  const fresh = freshCases === 0 ? "no fresh case" : freshCases === 1 ? "one fresh case" : `${freshCases} fresh cases`;
  return (
    <section aria-labelledby="sitting">
      <SectionHead title="The whole sitting" id="sitting" note="checks taken as independent of each other" />
      <dl className="mt-3 grid max-w-[46rem] text-dense">
        <Row term="Careful people, every check sat once" value={percentText(sitting.careful)} />
        <Row term={`Careful people, with ${fresh} a check`} value={percentText(sitting.carefulWithFresh)} />
        <Row term={`Blind guessing, with ${fresh} a check; at most 0.1\u00a0%`} value={percentText(sitting.guessed)}>
          <Glyph name={sitting.guessedWithin ? "within" : "outside"} />
          {sitting.guessedWithin ? "Within" : <strong className="font-bold">Outside</strong>}
        </Row>
      </dl>
      {sitting.taken.length > 0 && (
        <p className="mt-2 text-label font-normal text-ink-2">
          Judged by people, and taken as met: {sitting.taken.join(", ")}.
        </p>
      )}
    </section>
  );
}

function Row({ term, value, children }: { term: string; value: string; children?: React.ReactNode }) {
  return (
    <div className="grid grid-cols-[1fr_auto] items-center gap-x-4 border-b-hair border-rule py-2 tablet:grid-cols-[1fr_5rem_7rem]">
      <dt>{term}</dt>
      <dd className="text-right font-semibold figures">{value}</dd>
      <dd className="col-span-2 flex items-center gap-2.5 tablet:col-span-1">{children}</dd>
    </div>
  );
}
