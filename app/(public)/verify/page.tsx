import Link from "next/link";
import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SectionHead } from "@/components/ui/SectionHead";
import { readCertificateNumber } from "@/lib/certificates/number";
import { FileDrop } from "./_components/FileDrop";
import { NumberForm } from "./_components/NumberForm";
import { numberProblem } from "./_components/numberProblem";

export const metadata: Metadata = { title: "Verify a certificate" };

export default async function VerifyPage({ searchParams }: { searchParams: Promise<{ number?: string | string[] }> }) {
  const typed = (await searchParams).number;
  const text = Array.isArray(typed) ? typed[0] : typed;
  const read = text === undefined ? null : readCertificateNumber(text);
  if (read && "number" in read) redirect(`/verify/${read.number}`);
  return (
    <div className="page grid gap-x-14 gap-y-10 py-10 desk:grid-cols-[7fr_5fr]">
      <div>
        <h1 className="text-h1">Verify a certificate</h1>
        <p className="mt-3 max-w-measure text-lead text-ink-2">
          Whether it may be relied on today, what it covers and who decided. Free, and without an account.
        </p>
        <section className="mt-8 max-w-[560px]">
          <NumberForm value={text} error={read && "problem" in read ? numberProblem(read.problem) : null} />
        </section>
        <section className="mt-12 max-w-[560px]" aria-labelledby="file-head">
          <SectionHead title="Or the file itself" id="file-head" />
          <div className="mt-4">
            <FileDrop />
          </div>
        </section>
      </div>
      <aside>
        <SectionHead title="What you are told" />
        <ul className="mt-4 grid gap-3 text-dense">
          <li>
            The standing in the register at this moment: Valid, Suspended, Withdrawn, Expired, Superseded or Not yet
            valid.
          </li>
          <li>
            Name, scope and limits, the release that was sat, and who decided: inside or outside the candidate&rsquo;s
            line.
          </li>
          <li>For a file: whether its signature is genuine, covers every byte, and agrees with the register.</li>
          <li>Nothing is listed, and nobody can be searched for by name. The full number is needed.</li>
        </ul>
        <p className="mt-6 text-dense text-ink-2">
          You need not trust this page:{" "}
          <Link className="link" href="/trust">
            how to verify a file off line
          </Link>{" "}
          with public tools.
        </p>
      </aside>
    </div>
  );
}
