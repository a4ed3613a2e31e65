import "server-only";
import type { TrialEngine } from "@/lib/commands/engine";
import type { EngineThreads } from "./EngineThreads";

/** The engine of a release check: in the threads of the cases, after them. How far it is stands with its run. */
export const trialEngineFor = (threads: EngineThreads, signal: AbortSignal): TrialEngine => ({
  async trySlice(slice) {
    const result = await threads.run({ slice }, () => undefined, signal, false);
    if (!("slice" in result)) throw new Error("trialEngineFor: a slice was expected");
    return result.slice;
  },
});
