import { pdfDownload } from "@/lib/auth/pdfDownload";
import { personRoute } from "@/lib/auth/route";
import { NotFoundError } from "@/lib/errors";
import { getOwnCertificatePdf } from "@/lib/queries/getCertificate";

/** The holder's own signed file: for life, whichever employer issued it and whether or not a role is left there. */
export const GET = personRoute<{ number: string }>(async ({ params, person }) => {
  const pdf = await getOwnCertificatePdf(person, params.number);
  if (!pdf) throw new NotFoundError("certificate");
  return pdfDownload(pdf, `${params.number}.pdf`);
});
