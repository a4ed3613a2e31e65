import "server-only";
import { notFound } from "next/navigation";
import { ForbiddenError, NotFoundError } from "@/lib/errors";

/** For pages: what may not be read looks like what is not there. */
export async function orNotFound<View>(read: Promise<View | null>): Promise<View> {
  try {
    return (await read) ?? notFound();
  } catch (error) {
    if (error instanceof NotFoundError || error instanceof ForbiddenError) notFound();
    throw error;
  }
}
