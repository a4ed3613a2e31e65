// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import { useState } from "react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { AnswerForm } from "@/components/checks/AnswerForm";
import { Workspace } from "@/components/checks/Workspace";
import { chain } from "@/lib/checks/chain/chain";
import { planOf, seedOf } from "../../checks/planOf";

afterEach(cleanup);
const { publicCase, truth } = chain.build(seedOf(1), planOf(chain, { splitter: 100 }));

test("every part stands in the list of its kind, with the figures of its sheet", () => {
  render(<Workspace view={publicCase} filesAddress="/files" />);
  const lists = { amplifier: "Amplifiers", cable: "Cables", arrester: "Arresters", splitter: "Splitters" };
  for (const part of truth.site.parts) {
    const list = screen.getByRole("table", { name: lists[part.kind] });
    const row = within(list).getByRole("rowheader", { name: part.id }).closest("tr")!;
    if (part.kind === "amplifier") expect(row.textContent).toContain(`${part.gainDb.toFixed(1)}\u00a0dB`);
    if (part.kind === "cable") expect(row.textContent).toContain(`${part.dbPer100M.toFixed(1)}\u00a0dB/100 m`);
    if (part.kind === "arrester") expect(row.textContent).toContain(part.passesDc ? "passes" : "blocked");
    if (part.kind === "splitter") expect(row.textContent).toMatch(/port/);
  }
});

test("the bench's chain levels begin with the site and without its parts", () => {
  const { container } = render(<Workspace view={publicCase} filesAddress="/files" />);
  const { neighbourDbm, supplyV, gainToDb, runM } = truth.site;
  const values = [...container.querySelectorAll("input")].map((input) => input.value.replace("\u2212", "-"));
  for (const given of [neighbourDbm, supplyV, gainToDb, runM]) expect(values.map(Number)).toContain(given);
  expect(values).toContain("first part");
});

function Form() {
  const [answers, setAnswers] = useState<Readonly<Record<string, string>>>({});
  return (
    <>
      <AnswerForm
        sections={publicCase.sections}
        answers={answers}
        onChange={(fields) => setAnswers({ ...answers, ...fields })}
      />
      <output>{JSON.stringify(answers)}</output>
    </>
  );
}

test("parts are put in order row by row, and each row has a name of its own", async () => {
  render(<Form />);
  const person = userEvent.setup();
  for (const [n, id] of ["A2", "C1", "S1"].entries())
    await person.selectOptions(screen.getByRole("combobox", { name: `Part ${n + 1}` }), id);
  expect(JSON.parse(screen.getByRole("status").textContent!)).toEqual({
    "chain.1.part": "A2",
    "chain.2.part": "C1",
    "chain.3.part": "S1",
  });
  expect(screen.getByRole("combobox", { name: "Part 4" })).toBeTruthy();
});

test("a headroom may lie below zero, so its field has a key for the sign", () => {
  render(<Form />);
  expect(screen.getAllByRole("button", { name: /sign/i })).toHaveLength(1);
});
