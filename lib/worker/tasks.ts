import "server-only";
import { buildCase } from "@/lib/commands/buildCase";
import { checkRelease } from "@/lib/commands/checkRelease";
import { closeCase } from "@/lib/commands/closeCase";
import { issueCertificate, type IssueTools } from "@/lib/commands/issueCertificate";
import { markAgain } from "@/lib/commands/markAgain";
import { markCase } from "@/lib/commands/markCase";
import { reviewCase } from "@/lib/commands/reviewCase";
import { sendMail, type Outgoing } from "@/lib/commands/sendMail";
import { signVerification } from "@/lib/commands/signVerification";
import type { Storage } from "@/lib/storage/storage";
import { engineFor } from "./engineFor";
import type { EngineThreads } from "./EngineThreads";
import type { Tasks } from "./Lane";
import { trialEngineFor } from "./trialEngineFor";

export type WorkTools = IssueTools & {
  threads: EngineThreads;
  storage: Storage;
  seedKey: string;
  deliver: (mail: Outgoing) => Promise<void>;
};

/** What each job does: one command, safe to run twice. */
export const workerTasks = (tools: WorkTools): Tasks => ({
  "build-case": ({ caseId }, signal) =>
    buildCase(caseId, { ...tools, engine: engineFor(tools.threads, caseId, "build-case", signal) }),
  "close-case": ({ caseId }) => closeCase(caseId, tools.publicOrigin),
  "mark-case": ({ caseId }, signal) =>
    markCase(caseId, { ...tools, engine: engineFor(tools.threads, caseId, "mark-case", signal) }),
  "review-case": ({ reviewId, caseId }, signal) =>
    reviewCase({ reviewId, caseId }, { ...tools, engine: engineFor(tools.threads, caseId, "review-case", signal) }),
  "mark-again": ({ actId }) => markAgain(actId, tools.publicOrigin),
  "check-release": ({ runId }, signal) => checkRelease(runId, trialEngineFor(tools.threads, signal)),
  "issue-certificate": ({ decisionId }) => issueCertificate(decisionId, tools),
  "sign-verification": ({ verificationId }) => signVerification(verificationId, tools),
  "send-mail": ({ mailId }) => sendMail(mailId, tools.deliver),
});
