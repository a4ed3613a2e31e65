import type { Metadata } from "next";
import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { readCertificateNumber } from "@/lib/certificates/number";
import { log } from "@/lib/log";
import { getPublicVerification } from "@/lib/queries/getPublicVerification";
import { NoAnswer } from "../_components/NoAnswer";
import { numberProblem } from "../_components/numberProblem";
import { RegisterAnswer } from "../_components/RegisterAnswer";

export const metadata: Metadata = { title: "Verification", robots: { index: false } };

export default async function VerifyNumberPage({ params }: { params: Promise<{ number: string }> }) {
  const typed = decodeURIComponent((await params).number);
  const read = readCertificateNumber(typed);
  if ("problem" in read)
    return <NoAnswer title="This is no certificate number" typed={typed} error={numberProblem(read.problem)} />;
  if (read.number !== typed) redirect(`/verify/${read.number}`);
  const found = await lookUp(read.number);
  if (found === "too many") {
    return <NoAnswer title="Too many look-ups from this address" typed={typed} error="Wait a minute and ask again." />;
  }
  if (found === "unreachable") return <NoAnswer standing="cannot-be-told" typed={typed} />;
  if (!found) {
    const error = "No certificate has this number. Check the last character: it is computed from the others.";
    return <NoAnswer title="No certificate has this number" typed={typed} error={error} />;
  }
  return <RegisterAnswer entry={found} />;
}

/** When the register cannot be reached the answer is that it cannot be told, never valid. */
async function lookUp(number: string) {
  try {
    if (!(await throttlePublic(await headers()))) return "too many";
    return await getPublicVerification(number);
  } catch (error) {
    log.error(error, "the register could not be read");
    return "unreachable";
  }
}
