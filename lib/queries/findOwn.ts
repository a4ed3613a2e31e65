import "server-only";

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** Ids come from addresses: one that is none must look like a row that is not there, not like a fault. */
export const isId = (id: string): boolean => UUID.test(id);

export const iso = (at: Date): string => at.toISOString();
export const isoOrNull = (at: Date | null): string | null => at?.toISOString() ?? null;
