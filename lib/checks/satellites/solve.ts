import type { Answers, CaseFile, PublicCase } from "../kind";
import { readCapture } from "../captureFiles";
import { searchCapture } from "../searchCapture";
import { REFERENCE_SEARCH } from "./referenceSearch";
import { MOST_LINES } from "./publicCase";

export type Listed = { prn: number; codePhaseChips: number; dopplerHz: number; cn0DbHz: number };

/** So much under the level asked for is listed still, so that no satellite that must be found is left out. */
export const LISTED_BELOW_DB = 3;

/**
 * The right method, from the public case and its files: search the whole window, list what passes the threshold and can be
 * one of those asked for. What is much weaker may be a false alarm or a false peak, and nobody asks for it.
 */
export function solve({ publicCase, files }: { publicCase: PublicCase; files: readonly CaseFile[] }): Answers {
  const dopplerHalfWidthHz = publicCase.data.windowHz as number;
  const weakest = (publicCase.data.foundFromDbHz as number) - LISTED_BELOW_DB;
  const searched = searchCapture(readCapture(files), { ...REFERENCE_SEARCH, dopplerHalfWidthHz });
  return answersFor(searched.filter(({ found, cn0DbHz }) => found && cn0DbHz >= weakest));
}

/** A list written down as a careful person does. */
export function answersFor(listed: readonly Listed[]): Answers {
  const lines = listed.slice(0, MOST_LINES).flatMap(({ prn, codePhaseChips, dopplerHz, cn0DbHz }, n) => [
    [`satellites.${n + 1}.prn`, String(prn)],
    [`satellites.${n + 1}.codePhase`, codePhaseChips.toFixed(1)],
    [`satellites.${n + 1}.doppler`, dopplerHz.toFixed(0)],
    [`satellites.${n + 1}.cn0`, cn0DbHz.toFixed(1)],
  ]);
  return Object.fromEntries([["search.bin", `${REFERENCE_SEARCH.dopplerStepHz} Hz`], ...lines]);
}
