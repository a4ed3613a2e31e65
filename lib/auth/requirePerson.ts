import "server-only";
import { redirect } from "next/navigation";
import type { SignedIn } from "@/lib/queries/getSignedIn";
import { signedIn } from "./signedIn";
import { signInAddress } from "./signInAddress";

/** Who asks, whatever the employer: for pages about the person's own account. */
export const requirePerson = async (): Promise<SignedIn> => (await signedIn()) ?? redirect(await signInAddress());
