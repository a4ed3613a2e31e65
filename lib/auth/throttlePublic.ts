import "server-only";
import { ThrottledError } from "@/lib/errors";
import { fromAddress } from "./fromAddress";
import { throttle } from "./throttle";

// A person with a stack of certificates needs a few a minute; walking through numbers needs millions.
const LOOK_UPS = { points: 30, seconds: 60 };

/** Whether one more look-up of the public check is welcome from this address. */
export async function throttlePublic(headers: Pick<Headers, "get">): Promise<boolean> {
  try {
    await throttle(...fromAddress("public", headers, LOOK_UPS));
    return true;
  } catch (error) {
    if (error instanceof ThrottledError) return false;
    throw error;
  }
}
