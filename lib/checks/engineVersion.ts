/** Printed on every marking record. Raised whenever a built case or a marking may come out different. */
export const ENGINE_VERSION = "1.0.0";
