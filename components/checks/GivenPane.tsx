import type { ReactNode } from "react";
import { Cautions } from "@/components/ui/Cautions";
import { Ledger } from "@/components/ui/Ledger";
import { SectionHead } from "@/components/ui/SectionHead";
import { wholeNumbers } from "@/components/ui/wholeNumbers";
import { CAUTIONS } from "@/components/mdx/cautions";
import type { PublicCase } from "@/lib/checks/kind";
import type { OpenCaseView } from "@/lib/queries/getCase";

type GivenPaneProps = {
  open: Pick<OpenCaseView, "files"> & { view: PublicCase };
  filesAddress: string;
  /** What the lead wrote inside the check. */
  brief?: ReactNode;
};

/** What is given: the brief, the facts of the case, what is accepted, the files, the cautions. */
export function GivenPane({ open, filesAddress, brief }: GivenPaneProps) {
  const { view, files } = open;
  return (
    <div className="grid gap-6">
      <section>
        <SectionHead title="Given" />
        {brief && <div className="mt-3">{brief}</div>}
        <div className="mt-3 grid gap-3">
          {view.brief.map((paragraph) => (
            <p key={paragraph}>{wholeNumbers(paragraph)}</p>
          ))}
        </div>
        {view.given.length > 0 && <Ledger narrow className="mt-4" rows={view.given} />}
      </section>
      {files.length > 0 && (
        <section>
          <SectionHead title="Files" />
          <ul className="mt-2 grid gap-1 text-dense">
            {files.map((file) => (
              <li key={file.name} className="flex items-center justify-between gap-3">
                <a
                  className="link py-1 break-all pointer-coarse:py-3"
                  href={`${filesAddress}/${file.name}`}
                  download={file.name}
                >
                  {file.name}
                </a>
                <span className="whitespace-nowrap text-ink-2 figures">{size(file.sizeBytes)}</span>
              </li>
            ))}
          </ul>
          {files.some(({ name }) => name.endsWith(".sigmf-meta")) && (
            <p className="mt-2 text-label font-normal text-ink-2">A SigMF recording: keep both files together.</p>
          )}
        </section>
      )}
      <section>
        <SectionHead title="Accepted within" />
        <dl className="mt-1">
          {view.tolerances.map((row) => (
            <div
              key={row.quantity}
              className="grid grid-cols-[1fr_auto] gap-x-3 border-b-hair border-rule py-1.5 text-dense"
            >
              <dt>{row.label}</dt>
              <dd className="text-right font-semibold figures">{row.tolerance}</dd>
              <dd className="col-span-2 text-label font-normal text-ink-2">
                {row.critical && <strong className="text-minus-deep">Critical. </strong>}
                {wholeNumbers(row.reason)}
              </dd>
            </div>
          ))}
        </dl>
        <p className="mt-3 text-label font-normal text-ink-2">Nothing is marked until you hand in.</p>
      </section>
      {view.cautions.length > 0 && <Cautions items={view.cautions.map((topic) => CAUTIONS[topic])} />}
    </div>
  );
}

const size = (bytes: number) => (bytes < 100_000 ? `${Math.ceil(bytes / 1000)} kB` : `${(bytes / 1e6).toFixed(1)} MB`);
