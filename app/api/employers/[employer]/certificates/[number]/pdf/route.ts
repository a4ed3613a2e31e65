import { pdfDownload } from "@/lib/auth/pdfDownload";
import { route } from "@/lib/auth/route";
import { NotFoundError } from "@/lib/errors";
import { getCertificatePdf } from "@/lib/queries/getCertificate";

/** The signed file as it was issued: for the holder, and for the issuer's own people. */
export const GET = route<{ employer: string; number: string }>(async ({ params, actor }) => {
  const pdf = await getCertificatePdf(actor, params.number);
  if (!pdf) throw new NotFoundError("certificate");
  return pdfDownload(pdf, `${params.number}.pdf`);
});
