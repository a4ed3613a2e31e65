import { formatUnderstood } from "../formatUnderstood";

/** Three figures, however small or large. */
export const figures = (value: number): string => formatUnderstood(Number(value.toPrecision(3)), "1");
