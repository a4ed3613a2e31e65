import "server-only";
import { Person } from "@/models";
import { transact } from "./transact";

/** Correct the own name. Certificates keep the name they were issued with. */
export const renamePerson = (here: { personId: string }, name: string) =>
  transact(null, async (transaction) => {
    await Person.update({ name }, { where: { id: here.personId }, transaction });
  });
