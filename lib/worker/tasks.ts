import "server-only";
import { buildCase } from "@/lib/commands/buildCase";
import { closeCase } from "@/lib/commands/closeCase";
import { issueCertificate, type IssueTools } from "@/lib/commands/issueCertificate";
import { markCase } from "@/lib/commands/markCase";
import { sendMail, type Outgoing } from "@/lib/commands/sendMail";
import { signVerification } from "@/lib/commands/signVerification";
import type { Storage } from "@/lib/storage/storage";
import { engineFor } from "./engineFor";
import type { EngineThreads } from "./EngineThreads";
import type { Tasks } from "./Lane";

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
  "issue-certificate": ({ decisionId }) => issueCertificate(decisionId, tools),
  "sign-verification": ({ verificationId }) => signVerification(verificationId, tools),
  "send-mail": ({ mailId }) => sendMail(mailId, tools.deliver),
});
