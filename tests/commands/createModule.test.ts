import { beforeEach, expect, test } from "vitest";
import { createModule } from "@/lib/commands/createModule";
import { InvalidError } from "@/lib/errors";
import { readModule } from "@/lib/mdx/readModule";
import { makeFirm, type Firm } from "../support/factories";
import { everythingStored, expectNothingLeft, rowsOf } from "../support/written";

let firm: Firm;
beforeEach(async () => {
  firm = await makeFirm();
});
const begun = { code: "NEW-1", title: 'Read a "weak" trace: carefully' };
type Draft = { module_id: string; title: string; source: string; revision: number; saved_by: string };

test("begins with a draft that could be released as it stands", async () => {
  const { id } = await createModule(firm.lead, begun);
  expect(await rowsOf("modules")).toMatchObject([{ id, code: "NEW-1", employer_id: firm.employer.id }]);
  const [draft] = await rowsOf<Draft>("drafts");
  expect(draft).toMatchObject({ module_id: id, title: begun.title, revision: 1, saved_by: firm.lead.personId });
  const { problems, module } = await readModule(draft!.source);
  expect(problems).toEqual([]);
  expect(module?.frontMatter).toMatchObject(begun);
});

test("whoever begins a module has not written a word of it", async () => {
  await createModule(firm.lead, begun);
  expect(await rowsOf("draft_writers")).toEqual([]);
});

test("a code is given once in a firm, and is free in another", async () => {
  await createModule(firm.lead, begun);
  await expect(createModule(firm.lead, begun)).rejects.toMatchObject({
    name: "InvalidError",
    fields: { code: ["Your firm has a module NEW-1 already."] },
  });
  await createModule((await makeFirm()).lead, begun);
  expect(await rowsOf("modules")).toHaveLength(2);
});

test("asked twice at once, one module is begun and the other is told why not", async () => {
  const both = await Promise.allSettled([createModule(firm.lead, begun), createModule(firm.lead, begun)]);
  expect(both.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
  const refused = both.find((one) => one.status === "rejected");
  expect(refused?.reason).toBeInstanceOf(InvalidError);
  expect(await rowsOf("drafts")).toHaveLength(1);
});

test("refuses everybody but a lead", async () => {
  const before = await everythingStored();
  for (const role of ["technician", "assessor", "decider", "administrator"] as const) {
    await expect(createModule(firm[role], begun), role).rejects.toMatchObject({ name: "ForbiddenError" });
  }
  expect(await everythingStored()).toEqual(before);
});

test("a failure at the end leaves neither module nor draft", () =>
  expectNothingLeft("modules", () => createModule(firm.lead, begun)));
