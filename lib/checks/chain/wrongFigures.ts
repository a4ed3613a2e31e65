import { SPEED_OF_LIGHT_M_S } from "@/lib/gnss/constants";
import { stageOf, runLossDb, type Part, type Site } from "./site";

/*
 * Figures of a chain that come out of one wrong step each: for the wrong methods, for the fairness of a case and for the
 * reasons in a marking.
 */

const cableOf = (chain: readonly Part[]) => chain.find((part) => part.kind === "cable");

/** dB by which the net gain comes out too high when the sheet's loss at 1 GHz is taken for the loss at L1. */
export function lossLeftOutDb(chain: readonly Part[], { runM }: Site): number {
  const cable = cableOf(chain);
  return cable ? runLossDb(cable, runM) - (cable.dbPer100M * runM) / 100 : 0;
}

/** Noise figures in dB added up along the chain, the receiver's left out. */
export const noiseFiguresAddedDb = (chain: readonly Part[], site: Site): number =>
  chain.reduce((sum, part) => sum + stageOf(part, site).noiseFigureDb, 0);

/** ns by which the delay comes out too short when the run is taken at the speed of light in air. */
export function delayLeftOutNs(chain: readonly Part[], { runM }: Site): number {
  const cable = cableOf(chain);
  return cable ? (runM / SPEED_OF_LIGHT_M_S) * 1e9 * (1 / cable.velocityFactor - 1) : 0;
}
