// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, expect, test, vi } from "vitest";
import { takeReading } from "@/components/checks/takeReading";
import { Workspace } from "@/components/checks/Workspace";
import { formatNumber } from "@/components/ui/formatNumber";
import { jammedOrNot as kind } from "@/lib/checks/jammed-or-not/jammedOrNot";
import { meanChangeDb } from "@/lib/gnss/sky/cn0Change";
import { utcOf } from "@/lib/gnss/sky/receiverLog";
import { planOf, seedOf } from "@/tests/checks/planOf";
import { installPointerEvent } from "@/tests/support/pointerEvent";

beforeAll(installPointerEvent);
afterEach(cleanup);

const { publicCase: view, truth } = kind.trial!.build(seedOf(1), planOf(kind, { span: [40, 40] }));
const { log } = truth;
const plots = () => screen.getAllByRole("application");

test("C/N0, gain control, clock, position and Doppler stand under one cursor", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  expect(plots()).toHaveLength(5);
  plots()[1].focus();
  await userEvent.keyboard("{Home}{Shift>}{ArrowRight}{/Shift}");
  for (const plot of plots()) expect(plot.getAttribute("aria-label")).toContain(`${utcOf(log, 10)} UTC`);
  expect(screen.getByText(/^No satellite is tracked through both minutes/)).toBeTruthy();
});

test("the change round the cursor is the one that the check asks for", async () => {
  const onTake = vi.fn();
  render(<Workspace view={view} filesAddress="/files" onTake={onTake} />);
  plots()[1].focus();
  const middle = log.readings >> 1;
  await userEvent.keyboard("{ArrowLeft}");
  const mean = within(screen.getByRole("row", { name: /^Mean/ }))
    .getAllByRole("cell")
    .at(-1)!;
  expect(mean.textContent).toBe(formatNumber(meanChangeDb(log, middle - 1), 1, true));
  await userEvent.click(screen.getByRole("button", { name: `Take ${utcOf(log, middle - 1)}` }));
  expect(takeReading(view.sections, {}, onTake.mock.calls[0][0], "finding.start")).toEqual([
    { id: "finding.start", label: "Start, UTC", value: utcOf(log, middle - 1) },
  ]);
});

test("every plot has its table, and no curve holds a number that is none", async () => {
  const { container } = render(<Workspace view={view} filesAddress="/files" />);
  expect(screen.getAllByRole("button", { name: "Values as a table" })).toHaveLength(5);
  expect(container.innerHTML).not.toMatch(/NaN|undefined/);
});
