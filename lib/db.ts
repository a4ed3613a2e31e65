import "server-only";
import pg from "pg";
import { QueryTypes, Sequelize, type Transaction } from "sequelize";

// Pages and route handlers are bundled apart, so each would make a pool of its own.
const held = globalThis as typeof globalThis & { lagmarkDatabase?: Sequelize };

/** The one connection pool of this process. Connecting waits for the first query, so that a build needs no database. */
export const db = (held.lagmarkDatabase ??= new Sequelize({
  dialect: "postgres",
  dialectModule: pg,
  logging: false,
  pool: { max: 10, idle: 30_000 },
  define: { underscored: true, timestamps: false },
  hooks: { beforeConnect: readAddress },
}));

/** Rows of a query as plain objects; every value goes in as a replacement, never into the text. */
export const select = <Row extends object>(
  sql: string,
  replacements: Record<string, unknown> = {},
  transaction?: Transaction,
): Promise<Row[]> => db.query<Row>(sql, { replacements, transaction, type: QueryTypes.SELECT });

// Each process is given the address of its own role only, the others empty; the worker's is the one that may read seeds.
function readAddress(config: object): void {
  const address = process.env.WORKER_DATABASE_URL || process.env.DATABASE_URL;
  if (!address) throw new Error("DATABASE_URL (or WORKER_DATABASE_URL in a worker) is not set");
  const url = new URL(address);
  Object.assign(config, {
    host: url.hostname,
    port: Number(url.port || 5432),
    database: url.pathname.slice(1),
    username: decodeURIComponent(url.username),
    password: decodeURIComponent(url.password),
  });
}
