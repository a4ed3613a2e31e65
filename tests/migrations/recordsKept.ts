import { beforeEach, expect, test } from "vitest";
import { ownerRows } from "../support/owner";
import { everythingStored } from "../support/written";
import { makeEveryRecord, RECORDS } from "./everyRecord";

const REFUSED = /permission denied for table|is a table of records: a row is followed, never changed/;

/**
 * Whoever asks through `query` can neither change nor delete a row of a table of records.
 * @param oneColumn enough for a role that may change all of them, so that only the trigger is left to refuse it
 */
export function recordsAreKept(who: string, query: (sql: string) => Promise<unknown>, oneColumn = false): void {
  beforeEach(makeEveryRecord);

  test(`${who} cannot change a record, not even to what it is`, async () => {
    const before = await everythingStored();
    for (const { table, column } of await columns(oneColumn)) {
      await expect(query(`UPDATE ${table} SET "${column}" = "${column}"`), `${table}.${column}`).rejects.toThrow(
        REFUSED,
      );
    }
    expect(await everythingStored()).toEqual(before);
  });

  test(`${who} cannot delete a record`, async () => {
    const before = await everythingStored();
    for (const table of RECORDS) await expect(query(`DELETE FROM ${table}`), table).rejects.toThrow(REFUSED);
    expect(await everythingStored()).toEqual(before);
  });
}

// A generated identity refuses any value of its own before a trigger is asked.
const columns = (oneColumn: boolean) =>
  ownerRows<{ table: string; column: string }>(
    `SELECT ${oneColumn ? "DISTINCT ON (table_name)" : ""} table_name AS "table", column_name AS "column"
     FROM information_schema.columns
     WHERE table_schema = 'public' AND table_name = ANY($1) AND is_identity = 'NO' ORDER BY 1, 2`,
    [RECORDS],
  );
