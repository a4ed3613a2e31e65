/** @type {import("next").NextConfig} */
const config = {
  // Bundled, Sequelize cannot find pg and every chunk would get a copy of the models' connection.
  serverExternalPackages: ["sequelize", "pg-boss"],
  // The test command builds beside a running installation, never over it.
  distDir: process.env.NEXT_DIST_DIR ?? ".next",
  poweredByHeader: false,
  // Types are a step of the test command, over the whole project; checking them here too would only slow the start.
  typescript: { ignoreBuildErrors: true },
};

export default config;
