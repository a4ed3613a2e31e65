import "server-only";
import { createHash } from "node:crypto";
import { webEnv } from "@/lib/env";

/** As the sign-in library hashes the token of a link before it asks for it. */
export const hashLinkToken = (token: string): string =>
  createHash("sha256").update(`${token}${webEnv().NEXTAUTH_SECRET}`).digest("hex");
