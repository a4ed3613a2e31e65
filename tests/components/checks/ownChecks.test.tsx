// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { afterEach, expect, test, vi } from "vitest";
import { JudgingForm } from "@/app/(work)/[employer]/queue/judging/[case]/_components/JudgingForm";
import { AnswerForm } from "@/components/checks/AnswerForm";
import { Workspace } from "@/components/checks/Workspace";
import { formula } from "@/lib/checks/formula/formula";
import type { PublicCase } from "@/lib/checks/kind";
import { written } from "@/lib/checks/written/written";
import { CHAIN, planFrom } from "@/tests/checks/formula/plan";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const account = written.build(
  seedOf(1),
  planOf(written, { lines: [{ id: "seen", label: "what you saw", critical: true }] }),
).publicCase;

function Form({ view }: { view: PublicCase }) {
  const [answers, setAnswers] = useState<Readonly<Record<string, string>>>({});
  return (
    <>
      <Workspace view={view} filesAddress="/files" />
      <AnswerForm
        sections={view.sections}
        answers={answers}
        onChange={(fields) => setAnswers({ ...answers, ...fields })}
      />
    </>
  );
}

test("a formula check has a field for each quantity, with its unit and the key of its sign", async () => {
  const { publicCase } = formula.build(seedOf(1), planFrom(CHAIN));
  render(<Form view={publicCase} />);
  const level = screen.getByLabelText("Level at the receiver");
  await userEvent.type(level, "1.5 m");
  await userEvent.tab();
  expect(screen.getByText(/m does not fit/)).toBeTruthy();
  expect(screen.getAllByRole("button", { name: /^Turn the sign of/ })).toHaveLength(3);
  expect(screen.getByRole("link", { name: "bench" })).toBeTruthy();
});

test("a written account is typed into a field that counts and ends at its bound", async () => {
  render(<Form view={account} />);
  const field = screen.getByLabelText<HTMLTextAreaElement>(/what you saw/i);
  await userEvent.type(field, "A mast.");
  expect(screen.getByText("7 of 2000 characters")).toBeTruthy();
  expect(field.maxLength).toBe(2000);
});

test("an assessor can keep the record once every line is judged and what is outside has its reason", async () => {
  const judge = vi.fn(async () => ({ ok: true as const, value: undefined }));
  const lines = [
    { of: "seen", label: "What you saw", critical: true, text: "A mast." },
    { of: "done", label: "What you did", critical: false, text: "" },
  ];
  const { container } = render(
    <JudgingForm employer="firm" caseId="case" technician="Ada" lines={lines} judge={judge} />,
  );
  const line = (name: string) => within(screen.getByRole("region", { name }));
  const verdicts = () => JSON.parse(container.querySelector<HTMLInputElement>("[name=verdicts]")!.value) as unknown;
  expect(line("What you did").getByText("Nothing was handed in.")).toBeTruthy();
  expect(screen.getByText("Judge every line.")).toBeTruthy();
  await userEvent.click(line("What you saw").getByRole("radio", { name: /^Within/ }));
  await userEvent.click(line("What you did").getByRole("radio", { name: /^Outside/ }));
  expect(screen.getByText("Give a reason for every line that is outside.")).toBeTruthy();
  await userEvent.type(line("What you did").getByLabelText(/^Reason/), "Nothing there.");
  expect(screen.queryByText("Give a reason for every line that is outside.")).toBeNull();
  expect(verdicts()).toEqual([
    { of: "seen", within: true, reason: "" },
    { of: "done", within: false, reason: "Nothing there." },
  ]);
  await userEvent.click(screen.getByRole("button", { name: "Keep the marking record" }));
  expect(judge).toHaveBeenCalledOnce();
});
