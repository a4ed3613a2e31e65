// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { Workspace } from "@/components/checks/Workspace";
import { delayEntry } from "@/lib/checks/delay-entry/delayEntry";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const { publicCase, truth } = delayEntry.build(seedOf(2), planOf(delayEntry));

test("the list of parts, both traces and the bench's own sums", () => {
  render(<Workspace view={publicCase} filesAddress="/files" />);
  const table = screen.getByRole("table", { name: "List of parts" });
  expect(within(table).getAllByRole("row")).toHaveLength(truth.parts.length + 1);
  expect(within(table).getByText("none: measured by its echo")).toBeTruthy();
  expect(within(table).getByText(/drum label \d+\s?m/)).toBeTruthy();
  expect(screen.getAllByRole("application").length).toBeGreaterThanOrEqual(2);
  expect(screen.getByRole("heading", { name: "Delay budget" })).toBeTruthy();
  expect(screen.queryByRole("button", { name: /^Take \d/ })).toBeNull(); // nothing to take into after the hand-in
});

test("the cursor is moved by keyboard and its time is taken", async () => {
  const user = userEvent.setup();
  const onTake = vi.fn();
  render(<Workspace view={publicCase} filesAddress="/files" onTake={onTake} />);
  screen.getAllByRole("application")[0].focus();
  await user.keyboard("{Home}{ArrowRight}{ArrowRight}{Enter}");
  expect(onTake).toHaveBeenLastCalledWith({ timeNs: 1 }); // points stand 0.5 ns apart
  await user.click(screen.getByRole("button", { name: "Take 1.0 ns" }));
  expect(onTake).toHaveBeenCalledTimes(2);
});
