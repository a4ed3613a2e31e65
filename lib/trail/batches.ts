import type { Read } from "./finding";

const BATCH = 5000;

/**
 * Every row in order of `sequence`, a batch at a time, so that a long trail never stands in memory as a whole.
 * @param sql has $1 (rows after this sequence) and $2 (at most so many), ordered by sequence
 */
export async function* batches<Row extends { sequence: string }>(read: Read, sql: string): AsyncGenerator<Row> {
  for (let after = "0"; ;) {
    const rows = await read<Row>(sql, [after, BATCH]);
    yield* rows;
    if (rows.length < BATCH) return;
    after = rows.at(-1)!.sequence;
  }
}
