"use client";
import { useRouter } from "next/navigation";
import { useEffect } from "react";
import useSWR from "swr";
import { LinkKey } from "@/components/ui/LinkKey";
import { Notice } from "@/components/ui/Notice";
import { WorkBar } from "@/components/ui/WorkBar";
import { Working } from "@/components/ui/Working";
import type { OpenCaseView } from "@/lib/queries/getCase";
import type { CaseProgress } from "@/lib/queries/getCaseProgress";

const POLL_MS = 800;

const fetchProgress = async (address: string): Promise<CaseProgress> => {
  const response = await fetch(address);
  if (!response.ok) throw new Error(String(response.status));
  return (await response.json()) as CaseProgress;
};

/** While the worker draws or marks: how far it is, and what may be done meanwhile. */
export function CaseWaiting({ employer, open }: { employer: string; open: Omit<OpenCaseView, "brief"> }) {
  const router = useRouter();
  const { data, error } = useSWR(`/api/employers/${employer}/cases/${open.id}/progress`, fetchProgress, {
    refreshInterval: POLL_MS,
  });
  const building = open.state === "building";
  useEffect(() => {
    if (data && data.state !== open.state) router.refresh();
  }, [data, open.state, router]);
  return (
    <>
      <WorkBar
        eyebrow={`Sitting S-${open.sittingNumber}, case ${open.number} of ${open.ofCases}`}
        title={`${open.code} ${open.plan.title}`}
      />
      <div className="page max-w-[760px] py-10">
        {data?.fault ? (
          <Notice tone="minus" fact={building ? "Not drawn." : "Not computed."} reference={data.fault}>
            {building ? "No time runs." : "Your answers are kept."} The operator sees it and can start it again.
          </Notice>
        ) : open.plan.kind === "written" && !building ? (
          <Notice tone="plus" fact="Handed in.">
            An assessor reads your account and judges it line by line. You are mailed when that is done, and may close
            this page.
          </Notice>
        ) : (
          <Working
            label={data?.step ?? (building ? "Your data is being drawn" : "Your hand-in is being marked")}
            done={data?.total ? data.done : undefined}
            total={data?.total || undefined}
          >
            {building
              ? "Nobody else gets these numbers. The clock starts when they are there."
              : "The server computes the truth again from your own case. You may close this page; you are mailed."}
          </Working>
        )}
        {open.handedInAt && (
          <p className="mt-6 text-dense text-ink-2">
            {open.byClock ? "Handed in by the clock." : "Handed in."} You cannot change this case now.
          </p>
        )}
        {error && <p className="mt-4 text-dense text-ink-2">No signal. This page goes on by itself.</p>}
        <div className="mt-8">
          <LinkKey href={`/${employer}/sittings/${open.sittingId}`}>Back to the sitting</LinkKey>
        </div>
      </div>
    </>
  );
}
