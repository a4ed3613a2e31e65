import { formatInstant } from "@/components/ui/formatDay";
import { Glyph } from "@/components/ui/Glyph";
import { Notice } from "@/components/ui/Notice";
import { SectionHead } from "@/components/ui/SectionHead";
import { Working } from "@/components/ui/Working";
import type { CheckTrialView, TrialProgress } from "@/lib/queries/checkTrialView";
import { FailingCases } from "./FailingCases";
import { TrialLines } from "./TrialLines";

/** One check: its table, or how far it is; below it what a look at fewer cases showed. */
export function CheckTrial({ base, check }: { base: string; check: CheckTrialView }) {
  const { id, title, needed, result, run, preview, within } = check;
  return (
    <section aria-labelledby={`check-${id}`}>
      <SectionHead title={title} id={`check-${id}`} note={id} />
      {!needed && <p className="mt-3 text-dense">People judge this check, so there is nothing to try.</p>}
      {needed && result && (
        <>
          <p className="mt-3 flex flex-wrap items-center gap-2.5 text-dense">
            <Glyph name={within ? "within" : "outside"} />
            <strong className="font-bold">{within ? "Within its bounds" : "Outside its bounds"}</strong>
            <span className="text-ink-2">
              finished {formatInstant(result.finishedAt)}, engine {result.engineVersion}
            </span>
          </p>
          <TrialLines caption={`Release check of ${title}`} table={result} />
          <FailingCases base={`${base}/${id}`} table={result} />
        </>
      )}
      {run && <RunState run={run} />}
      {needed && !result && !run && <p className="mt-3 text-dense text-ink-2">Not tried yet.</p>}
      {preview && !result && (
        <div className="mt-5 border-l-strong border-rule-strong pl-4">
          <h3 className="text-h3">A look at {preview.progress.of} cases</h3>
          {preview.table ? (
            <>
              <p className="mt-1 text-label font-normal text-ink-2">It permits no release.</p>
              <TrialLines caption={`A look at ${title}`} table={preview.table} />
              <FailingCases base={`${base}/${id}`} table={preview.table} />
            </>
          ) : (
            <RunState run={preview.progress} />
          )}
        </div>
      )}
    </section>
  );
}

function RunState({ run }: { run: TrialProgress }) {
  if (run.state === "failed") {
    return (
      <Notice tone="minus" fact="Not computed." reference={run.fault ?? undefined} className="mt-3">
        What was counted is kept. Run it again; the operator has been told.
      </Notice>
    );
  }
  if (run.state === "stopped") {
    return (
      <p className="mt-3 flex items-center gap-2.5 text-dense">
        <Glyph name="suspended" /> Stopped at {run.tried} of {run.of} cases. Run it again and it goes on from there.
      </p>
    );
  }
  const whole = run.tried >= run.of && run.ofWhole > 0;
  return (
    <div className="mt-3 max-w-[46rem]">
      {whole ? (
        <Working label="Working whole cases from their files" done={run.whole} total={run.ofWhole} unit="cases">
          They take minutes. Sittings are marked first; you may close this page.
        </Working>
      ) : (
        <Working
          label={run.state === "waiting" ? "Waiting for the worker" : "Trying cases"}
          done={run.tried}
          total={run.of}
          unit="cases"
        />
      )}
    </div>
  );
}
