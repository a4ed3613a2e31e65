/** Settings of the web process that a single test file may be run without; scripts/test.mjs sets its own. */
const WEB_SETTINGS = {
  PUBLIC_ORIGIN: "http://127.0.0.1:3000",
  NEXTAUTH_SECRET: "a secret of tests, long enough for the rule",
  STRIPE_SECRET_KEY: "sk_test_of_tests",
  STRIPE_WEBHOOK_SECRET: "whsec_of_tests",
  // Tests say an address as a proxy would.
  TRUSTED_PROXIES: "1",
  STORAGE_URL: "file:///nowhere",
  ISSUER_CERTIFICATE_FILE: "/nowhere/certificate.pem",
  ISSUER_ROOT_FILE: "/nowhere/root.pem",
};

for (const [name, value] of Object.entries(WEB_SETTINGS)) process.env[name] ??= value;
