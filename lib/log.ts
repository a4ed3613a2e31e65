import "server-only";
import pino from "pino";

const SECRET_FIELDS = ["password", "passwordHash", "token", "secret", "seed", "truth", "authorization", "cookie"];

/** The one logger. Errors come out as name, message and constraint: never SQL, never a value that was in it. */
export const log = pino({
  level: process.env.LOG_LEVEL || "info",
  base: undefined,
  redact: SECRET_FIELDS.flatMap((name) => [name, `*.${name}`]),
  serializers: { err: describeError, error: describeError },
});

/** What may be written down about an error; a database error carries its statement with every value in it. */
export function describeError(error: unknown): Record<string, unknown> {
  if (!(error instanceof Error)) return { name: "not an Error", message: typeof error };
  const { constraint, code } = (parentOf(error) ?? error) as { constraint?: string; code?: string };
  return {
    name: error.name,
    message: parentOf(error) ? withoutValues(error.message) : error.message,
    ...(constraint && { constraint }),
    ...(code && { code }),
    at: error.stack
      ?.split("\n")
      .filter((line) => /^\s+at /.test(line))
      .slice(0, 8)
      .map((line) => line.trim()),
    ...(error.cause instanceof Error && { cause: describeError(error.cause) }),
  };
}

const parentOf = (error: Error): object | undefined => (error as { parent?: object }).parent;

// PostgreSQL quotes names of tables and columns, and also the value it stumbled over.
const withoutValues = (message: string) =>
  message.split("\n")[0].replace(/"[^"]*"?/g, (quoted) => (/^"[a-z_][a-z0-9_]*"$/.test(quoted) ? quoted : '"..."'));
