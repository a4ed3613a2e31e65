import { z } from "zod";
import { LONGEST_PASSWORD, SHORTEST_PASSWORD } from "@/lib/policies/passwordRule";
import { ROLES } from "@/lib/policies/actor";

export const emailAddress = z
  .string()
  .transform((text) => text.normalize("NFKC").trim().toLowerCase())
  .pipe(z.email("Enter an address such as name@firm.example.").max(254, "An address has at most 254 characters."));

const personName = z
  .string()
  .transform((text) => text.normalize("NFC").trim().replace(/\s+/g, " "))
  .pipe(
    z.string().min(1, "Enter the name as it stands on certificates.").max(120, "A name has at most 120 characters."),
  );

const givenPassword = z.string().min(1, "Enter your password.").max(LONGEST_PASSWORD);

const newPassword = z
  .string()
  .min(SHORTEST_PASSWORD, `A password has at least ${SHORTEST_PASSWORD} characters.`)
  .max(LONGEST_PASSWORD, `A password has at most ${LONGEST_PASSWORD} characters.`);

const role = z.enum(ROLES, "Choose a role.");
// One ticked box is sent as a value, several as a list, none not at all.
const oneOrMore = <T extends z.ZodType>(each: T, message: string) =>
  z.preprocess((value) => (value === undefined ? [] : [value].flat()), z.array(each).min(1, message));
const ticked = z
  .literal("on")
  .optional()
  .transform((value) => value === "on");
const id = z.uuid();
const day = z.iso.date("Enter a day.");
const back = z.string().max(2000).optional();

export const signInInput = z.object({ email: emailAddress, password: givenPassword, back });
export const mailLinkInput = z.object({ email: emailAddress, back });
export const followLinkInput = z.object({ email: emailAddress, token: z.string().min(1).max(100), back });
export const confirmPasswordInput = z.object({ password: givenPassword }).strict();
export const setPasswordInput = z
  .object({ current: z.string().max(LONGEST_PASSWORD).optional(), password: newPassword, again: z.string() })
  .strict()
  .refine(({ password, again }) => password === again, { path: ["again"], error: "The two are not the same." });
export const renamePersonInput = z.object({ name: personName }).strict();
export const endSessionInput = z.object({ sessionId: id }).strict();

export const addPersonInput = z
  .object({
    name: personName,
    email: emailAddress,
    roles: oneOrMore(role, "Choose one role or more."),
    outsideLine: ticked,
  })
  .strict();
export const grantRoleInput = z.object({ personId: id, role, outsideLine: ticked }).strict();
export const endRoleInput = z.object({ grantId: id }).strict();
export const recordTrainingInput = z
  .object({ technicianId: z.uuid("Choose a technician."), trainerId: z.uuid("Choose who trained."), endedOn: day })
  .strict();
