import "server-only";
import type { Engine } from "@/lib/commands/engine";
import type { JobName } from "@/lib/jobs/jobs";
import type { EngineTask } from "./computeCase";
import type { EngineThreads } from "./EngineThreads";
import { ProgressWriter } from "./ProgressWriter";

/** The engine for one run of one job: computes in a thread and tells whoever waits for the case how far it is. */
export function engineFor(threads: EngineThreads, caseId: string, job: JobName, signal: AbortSignal): Engine {
  const compute = async (task: EngineTask) => {
    const writer = new ProgressWriter(caseId, job);
    writer.progress(0, 1, "starting");
    try {
      return await threads.run(task, writer.progress, signal, job !== "review-case");
    } finally {
      await writer.close();
    }
  };
  return {
    async build(seedHex, plan) {
      const result = await compute({ seedHex, plan, answers: null });
      if (!("built" in result)) throw new Error("engineFor: a drawn case was expected");
      return result.built;
    },
    async mark(seedHex, plan, answers) {
      const result = await compute({ seedHex, plan, answers });
      if (!("marking" in result)) throw new Error("engineFor: a marking was expected");
      return result;
    },
  };
}
