import { issuerCertificates } from "@/lib/queries/issuerCertificates";

export const dynamic = "force-dynamic";

/** The certificates that a signature of this register is checked against, for tools that work off line. */
export async function GET(_request: Request, { params }: { params: Promise<{ file: string }> }): Promise<Response> {
  const { rootPem, certificatePem } = await issuerCertificates();
  const files = new Map([
    ["root.pem", rootPem],
    ["certificate.pem", certificatePem],
  ]);
  const pem = files.get((await params).file);
  if (!pem) return new Response("No such file", { status: 404 });
  return new Response(pem, {
    headers: { "content-type": "application/pem-certificate-chain", "cache-control": "public, max-age=3600" },
  });
}
