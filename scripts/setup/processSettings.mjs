/** What a process has no business with: its own role's address and keys only (lib/env.ts says what each one reads). */
const WITHHELD = {
  web: ["OWNER_DATABASE_URL", "WORKER_DATABASE_URL", "SEED_KEY", "ISSUER_KEY_FILE", "SMTP_URL", "MAIL_FROM"],
  worker: ["OWNER_DATABASE_URL", "DATABASE_URL", "NEXTAUTH_SECRET", "STRIPE_SECRET_KEY", "STRIPE_WEBHOOK_SECRET"],
  build: [
    ...["OWNER_DATABASE_URL", "DATABASE_URL", "WORKER_DATABASE_URL", "SEED_KEY", "NEXTAUTH_SECRET"],
    ...["STRIPE_SECRET_KEY", "STRIPE_WEBHOOK_SECRET", "ISSUER_KEY_FILE", "SMTP_URL"],
  ],
};

/**
 * The environment of one process. Withheld settings are set empty, not left out: the web framework reads .env by
 * itself and fills in whatever is not set at all.
 */
export function processSettings(kind, settings) {
  const withheld = Object.fromEntries(WITHHELD[kind].map((name) => [name, ""]));
  return {
    ...settings,
    NEXT_TELEMETRY_DISABLED: "1",
    NO_COLOR: "1",
    NEXTAUTH_URL: settings.PUBLIC_ORIGIN,
    ...withheld,
  };
}
