// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { EchoTraces } from "@/components/checks/EchoTraces";
import { Workspace } from "@/components/checks/Workspace";
import { delayEntry } from "@/lib/checks/delay-entry/delayEntry";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const { publicCase, truth } = delayEntry.build(seedOf(2), planOf(delayEntry));

test("the list of parts, both traces and the bench's own sums", () => {
  const { container } = render(<Workspace view={publicCase} filesAddress="/files" />);
  const rows = [...container.querySelector("table")!.rows].map((row) => row.textContent);
  expect(rows).toHaveLength(truth.parts.length + 1);
  expect(rows.filter((row) => row.includes("none: measured by its echo"))).toHaveLength(1);
  expect(rows.filter((row) => /installed \d.*drum label \d+\s?m, velocity factor 0\.\d\d/.test(row))).toHaveLength(1);
  expect(screen.getByText("Both traces")).toBeTruthy();
  expect(screen.getByText("Delay budget")).toBeTruthy();
  expect(screen.queryByText(/^Take \d/)).toBeNull(); // nothing to take into after the hand-in
});

test("the cursor is moved by keyboard and its time is taken", async () => {
  const user = userEvent.setup();
  const onTake = vi.fn();
  render(<EchoTraces data={truth.echoes} onTake={onTake} />);
  screen.getAllByRole("application")[0].focus();
  await user.keyboard("{Home}{ArrowRight}{ArrowRight}{Enter}");
  expect(onTake).toHaveBeenLastCalledWith({ timeNs: 1 }); // points stand 0.5 ns apart
  await user.click(screen.getByText("Take 1.0 ns"));
  expect(onTake).toHaveBeenCalledTimes(2);
});
