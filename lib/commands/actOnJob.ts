import "server-only";
import { select } from "@/lib/db";
import { ConflictError, InvalidError, NotFoundError } from "@/lib/errors";
import { enqueue } from "@/lib/jobs/enqueue";
import { JOBS, type JobPayload } from "@/lib/jobs/jobs";
import { stoppedJobs } from "@/lib/jobs/stoppedJobs";
import { authorize } from "@/lib/policies/authorize";
import { JobAct } from "@/models";
import type { JobActWord } from "@/models/JobAct";
import { requireId } from "./lockOwn";
import { transact } from "./transact";

type Operator = { personId: string; isOperator: boolean };
type Act = { jobId: string; act: JobActWord; reason: string };

/** A stopped job is put back once, with all its tries, or left with a reason. The same act pressed twice is once. */
export const actOnJob = (operator: Operator, { jobId, act, reason }: Act, now = new Date()) =>
  transact({ personId: operator.personId, employerId: "" }, async (transaction) => {
    authorize(operator.isOperator, "act on a stopped job");
    requireId(jobId, "stopped job");
    if (act === "leave" && reason.trim() === "")
      throw new InvalidError("Say why it is left.", { reason: ["Say why it is left."] });
    const stopped = (await stoppedJobs(transaction)).find(({ id }) => id === jobId);
    const where = { jobId };
    const row = { ...where, job: stopped?.name ?? "", act, reason: reason.trim(), personId: operator.personId, now };
    // Of two presses at once the second waits for the first one's row, and then adds nothing.
    const [added] = stopped ? await select<{ id: string }>(ADD, row, transaction) : [];
    if (!stopped || !added) {
      const earlier = await JobAct.findOne({ where, transaction });
      if (!earlier) throw new NotFoundError("stopped job");
      if (earlier.act !== act) throw new ConflictError("This job has been acted on already.");
      return { id: earlier.id };
    }
    const { name } = stopped;
    const payload = JOBS[name].payload.parse(stopped.data) as JobPayload<typeof name>;
    if (act === "try again") await enqueue(name, payload, transaction);
    return { id: added.id };
  });

const ADD = `
  INSERT INTO job_acts (job_id, job, act, reason, acted_by, acted_at) VALUES (:jobId, :job, :act, :reason, :personId, :now)
  ON CONFLICT (job_id) DO NOTHING RETURNING id`;
