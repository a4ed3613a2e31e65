import type { PublicCase } from "../kind";

/** The time of the receiver's own alarm, as the case gives it. */
export const timeText = ({ given }: PublicCase): string => given.find(({ label }) => label === ALARM)!.value;

export const ALARM = "Alarm of the receiver";
