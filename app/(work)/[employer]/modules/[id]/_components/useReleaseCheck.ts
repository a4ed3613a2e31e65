"use client";
import useSWR from "swr";
import type { ReleaseCheckView } from "@/lib/queries/getReleaseCheck";

const POLL_MS = 1500;

/** How the draft's checks stand; asked again and again while the worker computes. Null address: not asked at all. */
export function useReleaseCheck(employer: string, moduleId: string, { first, ask = true }: Options = {}) {
  const address = ask ? `/api/employers/${employer}/modules/${moduleId}/release-check` : null;
  return useSWR(address, fetchView, {
    fallbackData: first,
    refreshInterval: (view) => (view && isRunning(view) ? POLL_MS : 0),
  });
}

type Options = { first?: ReleaseCheckView; ask?: boolean };

const fetchView = async (address: string): Promise<ReleaseCheckView> => {
  const response = await fetch(address);
  if (!response.ok) throw new Error(String(response.status));
  return (await response.json()) as ReleaseCheckView;
};

const GOING = ["waiting", "running"];

/** Something is being computed, so that there will be news. */
export const isRunning = ({ checks }: ReleaseCheckView): boolean =>
  checks.some(
    ({ run, preview }) =>
      (run && GOING.includes(run.state)) || (preview && !preview.table && GOING.includes(preview.progress.state)),
  );
