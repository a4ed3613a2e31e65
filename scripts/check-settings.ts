// Run by `npm start` when a database is named from outside: everything missing or wrong, as one list.
import { settingProblems } from "@/lib/env";

const problems = settingProblems(["owner", "web", "worker"], process.env);
if (problems.length > 0) {
  process.stderr.write(
    `DATABASE_URL is set, so every setting has to come from the environment or .env:\n${problems.join("\n")}\n`,
  );
  process.exit(1);
}
