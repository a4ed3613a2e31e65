import { getPublicTrailHeads } from "@/lib/queries/getPublicTrailHeads";

export const dynamic = "force-dynamic";

/** Signed heads of the trail, for anyone to keep. */
export async function GET(): Promise<Response> {
  return Response.json(await getPublicTrailHeads(), { headers: { "cache-control": "public, max-age=60" } });
}
