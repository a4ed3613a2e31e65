/** The first thing a person needs to know: which row of which table, and what disagrees. */
export type Finding = { table: string; key: string; disagrees: string };

/** Rows of a query with $1, $2, ...; all calls of one check must see one moment of the database, in UTC. */
export type Read = <Row extends object>(sql: string, values?: unknown[]) => Promise<Row[]>;
