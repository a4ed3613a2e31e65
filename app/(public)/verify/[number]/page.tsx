import type { Metadata } from "next";
import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { readCertificateNumber } from "@/lib/certificates/number";
import { log } from "@/lib/log";
import { getPublicVerification } from "@/lib/queries/getPublicVerification";
import { getPublicVerificationRecord } from "@/lib/queries/getPublicVerificationRecord";
import { NoAnswer } from "../_components/NoAnswer";
import { numberProblem } from "../_components/numberProblem";
import { RegisterAnswer } from "../_components/RegisterAnswer";

export const metadata: Metadata = { title: "Verification", robots: { index: false } };

type VerifyNumberProps = {
  params: Promise<{ number: string }>;
  /** `record` is the id of a record of this verification that is being signed. */
  searchParams: Promise<{ record?: string | string[] }>;
};

export default async function VerifyNumberPage({ params, searchParams }: VerifyNumberProps) {
  const typed = decodeURIComponent((await params).number);
  const read = readCertificateNumber(typed);
  if ("problem" in read)
    return <NoAnswer title="This is no certificate number" typed={typed} error={numberProblem(read.problem)} />;
  if (read.number !== typed) redirect(`/verify/${read.number}`);
  const { record } = await searchParams;
  const found = await lookUp(read.number, String(record ?? ""));
  if (found === "too many") {
    return <NoAnswer title="Too many look-ups from this address" typed={typed} error="Wait a minute and ask again." />;
  }
  if (found === "unreachable") return <NoAnswer standing="cannot-be-told" typed={typed} />;
  if (!found) {
    const error = "No certificate has this number. Check the last character: it is computed from the others.";
    return <NoAnswer title="No certificate has this number" typed={typed} error={error} />;
  }
  return <RegisterAnswer {...found} />;
}

/** When the register cannot be reached the answer is that it cannot be told, never valid. */
async function lookUp(number: string, recordId: string) {
  try {
    if (!(await throttlePublic(await headers()))) return "too many";
    const entry = await getPublicVerification(number);
    const record = await getPublicVerificationRecord(recordId);
    return entry && { entry, record: record?.number === number ? record : null };
  } catch (error) {
    log.error(error, "the register could not be read");
    return "unreachable";
  }
}
