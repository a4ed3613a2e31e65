import "server-only";
import type { Adapter, AdapterUser } from "next-auth/adapters";
import { takeSignInLink } from "@/lib/commands/takeSignInLink";
import { Person } from "@/models";

/**
 * What the sign-in library needs to know of our tables for mailed links. Sessions are not its business (the cookie
 * carries the id of ours), and it makes no accounts.
 */
export const adapter: Adapter = {
  getUser: async (id) => userOf(await Person.findByPk(id)),
  getUserByEmail: async (email) => userOf(await Person.findOne({ where: { email } })),
  updateUser: async ({ id }) => userOf(await Person.findByPk(id, { rejectOnEmpty: true }))!,
  // The link is stored by the command that writes its mail.
  createVerificationToken: async (token) => token,
  useVerificationToken: async ({ identifier, token }) => {
    const taken = await takeSignInLink(identifier, token);
    return taken && { identifier: taken.email, token, expires: taken.expiresAt };
  },
};

// The library looks at id and address only; that a link arrived is what verifies the address.
const userOf = (person: Person | null): AdapterUser | null =>
  person && { id: person.id, email: person.email, emailVerified: person.createdAt };
