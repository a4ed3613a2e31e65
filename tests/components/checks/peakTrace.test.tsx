// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { takeReading } from "@/components/checks/takeReading";
import { Workspace } from "@/components/checks/Workspace";
import { sidePeak } from "@/lib/checks/side-peak/sidePeak";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const { publicCase: view, truth } = sidePeak.build(seedOf(2), planOf(sidePeak));
const tags = () => [...document.querySelectorAll(".plot-tag")].map((tag) => tag.textContent!);

test("the cursor begins at the tracked lag and moves on both plots at once", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  const [whole] = screen.getAllByRole("application");
  const start = truth.fromChips + Math.round((truth.trackedLagChips - truth.fromChips) / 0.005) * 0.005;
  expect(screen.getByRole("heading", { name: /^Close to/ }).textContent!.replace(/\s/g, "")).toContain(
    start.toFixed(3),
  );
  whole!.focus();
  await userEvent.keyboard("{ArrowRight}");
  for (const tag of tags()) expect(tag.replace(/\s/g, "")).toContain((start + 0.005).toFixed(3));
  expect(screen.queryByRole("button", { name: /^Take/ })).toBeNull();
});

test("the highest point can be taken into the lag of the main peak", async () => {
  const onTake = vi.fn();
  render(<Workspace view={view} filesAddress="/files" onTake={onTake} />);
  screen.getAllByRole("application")[0]!.focus();
  await userEvent.keyboard("{Home}{ArrowRight}p");
  await userEvent.click(screen.getByRole("button", { name: /^Take/ }));
  const [[reading]] = onTake.mock.calls;
  expect(reading.magnitude).toBe(Math.max(...truth.trace));
  expect(takeReading(view.sections, {}, reading, null)).toEqual([
    { id: "lock.lag", label: "Lag of the main peak", value: reading.lagChips.toFixed(3) },
  ]);
});

test("the same points stand in a table", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  await userEvent.click(screen.getAllByRole("button", { name: "Values as a table" })[1]!);
  expect(screen.getAllByRole("row")).toHaveLength(62);
});
