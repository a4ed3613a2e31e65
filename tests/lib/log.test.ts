import { UniqueConstraintError, DatabaseError, ValidationErrorItem } from "sequelize";
import { expect, test } from "vitest";
import { describeError } from "@/lib/log";

/** As the driver makes it: the message of PostgreSQL, and the statement with its values. */
const fromDriver = (message: string, more: object = {}) =>
  Object.assign(new Error(message), { sql: "UPDATE people SET password_hash = 'argon-hash-of-somebody'", ...more });

test("a database error is written down without its statement", () => {
  const described = describeError(
    new DatabaseError(fromDriver("permission denied for table people", { code: "42501" })),
  );
  expect(described).toMatchObject({ name: "SequelizeDatabaseError", code: "42501" });
  expect(described.message).toBe("permission denied for table people");
  expect(JSON.stringify(described)).not.toContain("argon-hash");
});

test("a value that PostgreSQL quotes in its message is left out, names stay", () => {
  const of = (message: string) => describeError(new DatabaseError(fromDriver(message))).message;
  expect(of('invalid input syntax for type uuid: "tech@firm.example"')).toBe(
    'invalid input syntax for type uuid: "..."',
  );
  expect(of('column "cn0_db_hz" of relation "cases" does not exist')).toBe(
    'column "cn0_db_hz" of relation "cases" does not exist',
  );
});

test("a broken constraint is named", () => {
  const parent = fromDriver("duplicate key", { constraint: "people_email_key", code: "23505" });
  const errors: ValidationErrorItem[] = [];
  const described = describeError(new UniqueConstraintError({ parent, errors, message: "Validation error" }));
  expect(described).toMatchObject({ name: "SequelizeUniqueConstraintError", constraint: "people_email_key" });
  expect(JSON.stringify(described)).not.toContain("argon-hash");
});

test("the cause of an error is described by the same rule", () => {
  const described = describeError(new Error("the mail stays queued", { cause: new DatabaseError(fromDriver("gone")) }));
  expect(described).toMatchObject({ message: "the mail stays queued", cause: { message: "gone" } });
  expect(JSON.stringify(described)).not.toContain("argon-hash");
});

test("what is thrown but is no error says nothing about its content", () => {
  expect(JSON.stringify(describeError("token abc"))).not.toContain("abc");
});
