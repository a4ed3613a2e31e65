import "server-only";
import { AppError, InvalidError, SignInAfreshError } from "@/lib/errors";

/** What an action answers: plain, for the screen. `afresh` asks for the password before the same press again. */
export type ActionResult<R = unknown> =
  { ok: true; value: R } | { ok: false; message: string; fields?: Readonly<Record<string, string[]>>; afresh?: true };

/** Only our own errors carry words for people; bugs and Next's redirect() keep going. */
export async function toResult<R>(run: () => Promise<R>): Promise<ActionResult<R>> {
  try {
    return { ok: true, value: await run() };
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    return {
      ok: false,
      message: error.publicMessage,
      ...(error instanceof InvalidError && { fields: error.fields }),
      ...(error instanceof SignInAfreshError && { afresh: true }),
    };
  }
}
