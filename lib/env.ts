import "server-only";
import { z } from "zod";

const text = z.string().trim().min(1);
const postgres = z.url({ protocol: /^postgres(ql)?$/, error: "is not a postgres:// address" });
const web = z.url({ protocol: /^https?$/, error: "is not an http(s) address" });
const origin = web.refine((value) => new URL(value).origin === value, "holds more than scheme, host and port");
const onThisMachine = (value: string) => ["localhost", "127.0.0.1"].includes(new URL(value).hostname);

/** Every setting there is; the description is what a person reads when it is missing. */
export const SETTINGS = z.object({
  PUBLIC_ORIGIN: origin
    .refine((value) => value.startsWith("https:") || onThisMachine(value), "must be https, except on this machine")
    .describe("the address people reach the product at, without a path: it stands in mails, QR codes and certificates"),
  NEXTAUTH_SECRET: text.min(32, "is shorter than 32 characters").describe("signs the session cookies"),
  OWNER_DATABASE_URL: postgres.describe("PostgreSQL as the role that owns the tables: migrations only"),
  DATABASE_URL: postgres.describe("PostgreSQL as the web process's role"),
  WORKER_DATABASE_URL: postgres.describe("PostgreSQL as the worker's role, the only one that may read seeds and truth"),
  STRIPE_SECRET_KEY: text.startsWith("sk_", "does not start with sk_").describe("secret key for card payments"),
  STRIPE_WEBHOOK_SECRET: text.startsWith("whsec_", "does not start with whsec_").describe("verifies payment events"),
  STRIPE_API_URL: origin.optional().describe("another host for the payment API: demonstration and tests only"),
  SMTP_URL: z.url({ protocol: /^smtps?$/, error: "is not an smtp(s):// address" }).describe("mail server"),
  MAIL_FROM: text.includes("@", { error: "holds no address" }).describe("sender of every mail"),
  ISSUER_KEY_FILE: text.describe("PEM file of the issuer's private key (P-256): signs certificates"),
  ISSUER_CERTIFICATE_FILE: text.describe("PEM file of the certificate that belongs to the issuer's key"),
  ISSUER_ROOT_FILE: text.describe("PEM file of the root the issuer's certificate leads to"),
  SEED_KEY: text
    .regex(/^[\w-]{43}$/, "is not 32 bytes in base64url (43 characters)")
    .describe("seals the seeds of cases; losing it makes old cases impossible to re-create"),
  STORAGE_URL: z
    .url({ protocol: /^(file|s3)$/, error: "is neither file:///folder nor s3://bucket" })
    .describe("where captures and certificates are kept"),
  AWS_ACCESS_KEY_ID: text.optional().describe("key of the S3 storage, unless the machine itself is trusted"),
  AWS_SECRET_ACCESS_KEY: text.optional().describe("secret of the S3 storage"),
  TRUSTED_PROXIES: text
    .regex(/^[0-9]$/, "is not a number from 0 to 9")
    .optional()
    .describe("how many of your own proxies stand in front and add the sender's address; 0"),
  LOG_LEVEL: z.enum(["trace", "debug", "info", "warn", "error"]).optional().describe("how much is logged; info"),
  DEMONSTRATION: z.literal("1").optional().describe("set by npm start alone: every page says Demonstration"),
  DEMONSTRATION_MAIL_URL: origin.optional().describe("set by npm start alone: where its mails can be read"),
});

const STORAGE = { STORAGE_URL: true, AWS_ACCESS_KEY_ID: true, AWS_SECRET_ACCESS_KEY: true } as const;
const ISSUER = { ISSUER_CERTIFICATE_FILE: true, ISSUER_ROOT_FILE: true } as const;
const BOTH = { PUBLIC_ORIGIN: true, DEMONSTRATION: true, LOG_LEVEL: true, ...STORAGE, ...ISSUER } as const;
const STRIPE = { STRIPE_SECRET_KEY: true, STRIPE_WEBHOOK_SECRET: true, STRIPE_API_URL: true } as const;

/** What each process reads, and nothing beyond: the web process cannot leak a key it never had. */
const READS = {
  owner: SETTINGS.pick({ OWNER_DATABASE_URL: true }),
  web: SETTINGS.pick({
    ...BOTH,
    ...STRIPE,
    DATABASE_URL: true,
    NEXTAUTH_SECRET: true,
    TRUSTED_PROXIES: true,
    DEMONSTRATION_MAIL_URL: true,
  }),
  worker: SETTINGS.pick({
    ...BOTH,
    WORKER_DATABASE_URL: true,
    SMTP_URL: true,
    MAIL_FROM: true,
    ISSUER_KEY_FILE: true,
    SEED_KEY: true,
  }),
  storage: SETTINGS.pick(STORAGE),
};
type Kind = keyof typeof READS;
type Source = Readonly<Record<string, string | undefined>>;

export const ownerEnv = once(() => readEnv("owner", process.env));
export const webEnv = once(() => readEnv("web", process.env));
export const workerEnv = once(() => readEnv("worker", process.env));
/** Web and worker both use the storage. */
export const storageEnv = once(() => readEnv("storage", process.env));

/** @throws Error that lists everything missing or wrong, each with what it is for */
export function readEnv<K extends Kind>(kind: K, source: Source): z.output<(typeof READS)[K]> {
  const problems = settingProblems([kind], source);
  if (problems.length > 0) throw new Error(`Settings of the ${kind} process:\n${problems.join("\n")}`);
  return READS[kind].parse(filled(source)) as z.output<(typeof READS)[K]>;
}

/** One line for each setting that is missing or wrong; the value itself, which may be a secret, is not repeated. */
export function settingProblems(kinds: readonly Kind[], source: Source): string[] {
  const issues = kinds.flatMap((kind) => READS[kind].safeParse(filled(source)).error?.issues ?? []);
  const lines = issues.map(({ path, message }) => {
    const name = String(path[0]) as keyof typeof SETTINGS.shape;
    const problem = filled(source)[name] === undefined ? "is missing" : message;
    return `  ${name} ${problem} (${SETTINGS.shape[name].description})`;
  });
  return [...new Set([...lines, ...misusedStandIns(source)])];
}

// A stand-in that slipped into a real installation would take payments that never happened.
function misusedStandIns(source: Source): string[] {
  const { DEMONSTRATION, STRIPE_API_URL, STRIPE_SECRET_KEY } = filled(source);
  if (!DEMONSTRATION) return STRIPE_API_URL ? ["  STRIPE_API_URL is for the demonstration only"] : [];
  return STRIPE_SECRET_KEY?.startsWith("sk_live_") ? ["  STRIPE_SECRET_KEY is a live key in a demonstration"] : [];
}

/** Set but empty means not set: processes are handed what they must not have as an empty value. */
const filled = (source: Source): Source =>
  Object.fromEntries(Object.entries(source).filter(([, value]) => value !== ""));

function once<Value>(read: () => Value): () => Value {
  let held: { value: Value } | undefined;
  return () => (held ??= { value: read() }).value;
}
