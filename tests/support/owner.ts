import pg from "pg";

const address = process.env.OWNER_DATABASE_URL;
if (!address) throw new Error("OWNER_DATABASE_URL is not set: run the database tests through npm test");

// A day is a day and not an instant of this machine's time zone.
const DAY = 1082;
const types = {
  getTypeParser: (id: number, format?: "text" | "binary") =>
    id === DAY ? String : pg.types.getTypeParser(id, format as "text"),
};

/** The owner's connections: what a test puts in or looks at, past the rights of web and worker. */
export const owner = new pg.Pool({ connectionString: address, max: 3, types: types as pg.CustomTypesConfig });

/** Rows of a query as PostgreSQL names the columns. */
export const ownerRows = async <Row extends object>(sql: string, values: unknown[] = []): Promise<Row[]> =>
  (await owner.query<Row>(sql, values)).rows;

/** Insert one row given in camel case; what the database filled in comes back with it, in camel case too. */
export async function insert<Row extends object>(table: string, row: object): Promise<Row> {
  const fields = Object.entries(row).filter(([, value]) => value !== undefined);
  const columns = fields.map(([name]) => `"${name.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)}"`);
  const places = fields.map((_, index) => `$${index + 1}`);
  const sql = `INSERT INTO ${table} (${columns.join(", ")}) VALUES (${places.join(", ")}) RETURNING *`;
  const [stored] = await ownerRows<Record<string, unknown>>(
    sql,
    fields.map(([, value]) => sent(value)),
  );
  return Object.fromEntries(Object.entries(stored!).map(([column, value]) => [camel(column), value])) as Row;
}

const camel = (column: string) => column.replace(/_([a-z0-9])/g, (_, letter: string) => letter.toUpperCase());

// Lists would become PostgreSQL arrays; every list of ours is a JSON column.
const sent = (value: unknown): unknown =>
  typeof value === "object" && value !== null && !(value instanceof Date) && !Buffer.isBuffer(value)
    ? JSON.stringify(value)
    : value;
