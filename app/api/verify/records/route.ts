import { setTimeout as wait } from "node:timers/promises";
import { isSameOrigin } from "@/lib/auth/isSameOrigin";
import { readAtMost } from "@/lib/auth/readAtMost";
import { throttlePublic } from "@/lib/auth/throttlePublic";
import { LARGEST_PDF_BYTES } from "@/lib/certificates/verifyPdf";
import { askVerification } from "@/lib/commands/askVerification";
import { getPublicVerificationRecord } from "@/lib/queries/getPublicVerificationRecord";
import { verifyPublicFile } from "@/lib/queries/verifyPublicFile";

const LONGEST_FORM_BYTES = 1024;
/** A worker that has nothing else to do signs within a second. */
const WAIT_MS = 4000;
const LOOK_EVERY_MS = 200;

/**
 * Ask for a signed record of a verification: by a form with the number, or with the file itself as the body, which is
 * then held against the register. Answered with where the record is, or with the page that waits for it.
 */
export async function POST(request: Request): Promise<Response> {
  if (!isSameOrigin(request)) return new Response("This request came from another site.", { status: 403 });
  return request.headers.get("content-type") === "application/pdf" ? withFile(request) : withForm(request);
}

async function withForm(request: Request): Promise<Response> {
  const body = await readAtMost(request, LONGEST_FORM_BYTES);
  const number = new URLSearchParams(body?.toString("utf8")).get("number") ?? "";
  // The page of the number says what is wrong: unknown, or asked too often.
  const page = `/verify/${encodeURIComponent(number)}`;
  const id = (await throttlePublic(request.headers)) ? await askVerification({ number, fileSha256: null }) : null;
  return new Response(null, { status: 303, headers: { location: id ? await placeOf(id, page) : page } });
}

async function withFile(request: Request): Promise<Response> {
  if (!(await throttlePublic(request.headers))) return new Response("too many look-ups", { status: 429 });
  const pdf = await readAtMost(request, LARGEST_PDF_BYTES);
  if (!pdf) return new Response("a certificate is never this large", { status: 413 });
  const { file, register } = await verifyPublicFile(pdf);
  const id = register && (await askVerification({ number: register.number, fileSha256: file.sha256 }));
  if (!id) return new Response("the register has no such entry", { status: 404 });
  return Response.json({ address: await placeOf(id, `/verify/${register.number}`) }, { status: 201 });
}

/** The file once it is signed; else the page, which goes on waiting. */
async function placeOf(id: string, page: string): Promise<string> {
  const until = performance.now() + WAIT_MS;
  do {
    const record = await getPublicVerificationRecord(id);
    if (record?.signed) return `/api/verify/records/${id}`;
    if (!record || record.fault) break;
    await wait(LOOK_EVERY_MS);
  } while (performance.now() < until);
  return `${page}?record=${id}`;
}
