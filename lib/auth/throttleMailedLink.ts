import "server-only";
import { fromAddress } from "./fromAddress";
import { throttle } from "./throttle";

const HOUR = 3600;
/** Nobody's mailbox is to be filled by somebody else, and no list of addresses tried out. */
const TO_ONE_ADDRESS = { points: 5, seconds: HOUR };
const FROM_THE_MACHINE = { points: 30, seconds: HOUR };

/** @throws ThrottledError whether or not there is an account */
export async function throttleMailedLink(email: string, headers: Pick<Headers, "get">): Promise<void> {
  await throttle(...fromAddress("link", headers, FROM_THE_MACHINE));
  await throttle(`link to ${email}`, TO_ONE_ADDRESS);
}
