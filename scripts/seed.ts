// Fills an empty database with an invented firm, so that the demonstration can be walked from a draft to a certificate.
// Nothing computed is seeded here: sittings, markings and certificates come from using it.
import { mkdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { transact } from "@/lib/commands/transact";
import { hashPassword } from "@/lib/passwords";
import type { Role } from "@/lib/policies/actor";
import { Draft, Employer, Module, Person, RoleGrant } from "@/models";
import { db } from "@/lib/db";
import type { Transaction } from "sequelize";

const PASSWORD = "nine-knots-to-Carrow";

type Seeded = {
  name: string;
  email: string;
  says: string;
  roles?: [employer: "works" | "masts", role: Role][];
  operator?: boolean;
};

const PEOPLE: readonly Seeded[] = [
  { name: "Ines Tarrow", email: "ines.tarrow@saltmarsh.example", says: "lead", roles: [["works", "lead"]] },
  {
    name: "Pelle Okoro",
    email: "pelle.okoro@saltmarsh.example",
    says: "administrator",
    roles: [["works", "administrator"]],
  },
  {
    name: "Daud Fenwick",
    email: "daud.fenwick@saltmarsh.example",
    says: "technician",
    roles: [["works", "technician"]],
  },
  {
    name: "Orla Quist",
    email: "orla.quist@tidewater.example",
    says: "outside decider",
    roles: [
      ["works", "decider"],
      ["masts", "lead"],
    ],
  },
  { name: "Marit Holl", email: "marit.holl@saltmarsh.example", says: "assessor", roles: [["works", "assessor"]] },
  {
    name: "Sefton Braye",
    email: "sefton.braye@saltmarsh.example",
    says: "second lead",
    roles: [
      ["works", "lead"],
      ["works", "decider"],
    ],
  },
  {
    name: "Wanda Pruitt",
    email: "wanda.pruitt@saltmarsh.example",
    says: "second technician",
    roles: [["works", "technician"]],
  },
  { name: "Ebbe Lorne", email: "ebbe.lorne@tidewater.example", says: "verifier", roles: [["masts", "administrator"]] },
  { name: "Cato Wynn", email: "cato.wynn@operator.example", says: "operator", operator: true },
];

/** The firm's procedures, each with the lead who keeps it. */
const MODULES = [
  ["SBW-T1", "Ines Tarrow"],
  ["SBW-I1", "Sefton Braye"],
  ["SBW-R2", "Ines Tarrow"],
] as const;

await transact(null, async (transaction) => {
  if (await Employer.count({ transaction })) return;
  const works = await Employer.create({ slug: "saltmarsh", name: "Saltmarsh Beacon Works" }, { transaction });
  const masts = await Employer.create({ slug: "tidewater", name: "Tidewater Masts" }, { transaction });
  const passwordHash = await hashPassword(PASSWORD);
  const ids = new Map<string, string>();
  for (const { name, email, roles = [], operator = false } of PEOPLE) {
    const person = await Person.create({ name, email, passwordHash, isOperator: operator }, { transaction });
    ids.set(name, person.id);
    for (const [employer, role] of roles) {
      const employerId = (employer === "works" ? works : masts).id;
      // Orla Quist decides for the works from a sister firm; Sefton Braye would decide within the line.
      const outsideLine = role === "decider" && email.endsWith("@tidewater.example");
      await RoleGrant.create({ personId: person.id, employerId, role, outsideLine }, { transaction });
    }
  }
  for (const [code, keeper] of MODULES) await seedModule(works.id, code, ids.get(keeper)!, transaction);
});
await tellSignIns();
await db.close();

async function seedModule(employerId: string, code: string, leadId: string, transaction: Transaction) {
  const file = path.join(import.meta.dirname, "..", "content", "modules", `${code.toLowerCase()}.mdx`);
  const source = await readFile(file, "utf8");
  const begun = await Module.create({ employerId, code, createdBy: leadId }, { transaction });
  const title = /^title: (.+)$/m.exec(source)![1]!;
  await Draft.create({ moduleId: begun.id, title, source, savedBy: leadId }, { transaction });
  await db.query(`INSERT INTO draft_writers (module_id, person_id) VALUES (:moduleId, :leadId)`, {
    replacements: { moduleId: begun.id, leadId },
    transaction,
  });
}

/** The start command shows these; they exist only in a demonstration. */
async function tellSignIns() {
  const file = process.env.DEMO_SIGN_INS_FILE;
  if (!file) return;
  await mkdir(path.dirname(file), { recursive: true });
  const lines = PEOPLE.map(({ says, name, email }) => ({ role: says, name, email, password: PASSWORD }));
  await writeFile(file, JSON.stringify(lines, null, 2), { mode: 0o600 });
}
