// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, expect, test, vi } from "vitest";
import { takeReading } from "@/components/checks/takeReading";
import { Workspace } from "@/components/checks/Workspace";
import { lostDecibels as kind } from "@/lib/checks/lost-decibels/lostDecibels";
import { bandMeans, utcOf } from "@/lib/gnss/sky/receiverLog";
import { planOf, seedOf } from "@/tests/checks/planOf";
import { installPointerEvent } from "@/tests/support/pointerEvent";

beforeAll(installPointerEvent);
afterEach(cleanup);

const { publicCase: view, truth } = kind.trial!.build(seedOf(1), planOf(kind, { hours: [2, 2] }));
const { log } = truth;
const plots = () => screen.getAllByRole("application");
const plain = (text: string | null | undefined) => (text ?? "").replace(/\s/g, " ");

test("one cursor moves on every plot", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  plots()[2].focus();
  await userEvent.keyboard("{Home}{ArrowRight}{ArrowRight}");
  for (const plot of plots()) expect(plot.getAttribute("aria-label")).toContain(`${utcOf(log, 2)} UTC`);
  expect(screen.queryByRole("button", { name: /^Take/ })).toBeNull();
});

test("up and down choose the satellite whose C/N0 is drawn large", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  const prns = [...new Set(log.passes.map(({ prn }) => prn))].sort((a, b) => a - b);
  expect(screen.getByRole("heading", { name: `PRN ${prns[0]}` })).toBeTruthy();
  plots()[0].focus();
  await userEvent.keyboard("{ArrowDown}");
  expect(screen.getByRole("heading", { name: `PRN ${prns[1]}` })).toBeTruthy();
  await userEvent.keyboard("{ArrowUp}{ArrowUp}");
  expect(screen.getByRole("heading", { name: `PRN ${prns[0]}` })).toBeTruthy();
});

test("time and azimuth are taken into the field that is open, and into no other", async () => {
  const onTake = vi.fn();
  render(<Workspace view={view} filesAddress="/files" onTake={onTake} />);
  plots()[1].focus();
  await userEvent.keyboard("{Home}");
  await userEvent.click(screen.getByRole("button", { name: /^Take/ }));
  const [[reading]] = onTake.mock.calls;
  expect(takeReading(view.sections, {}, reading, "fault.stop")).toEqual([
    { id: "fault.stop", label: "Stop, UTC", value: utcOf(log, 0) },
  ]);
  expect(takeReading(view.sections, {}, { ...reading, azimuthDeg: 127.4 }, "fault.azimuthTo")).toMatchObject([
    { id: "fault.azimuthTo", value: "127" },
  ]);
  expect(takeReading(view.sections, {}, reading, null)).toEqual([]);
});

test("means by elevation leave out what the person leaves out", async () => {
  render(<Workspace view={view} filesAddress="/files" />);
  const high = () =>
    plain(
      within(screen.getByRole("row", { name: /^60° to 90°/ }))
        .getAllByRole("cell")
        .at(-1)!.textContent,
    );
  expect(high()).toBe(bandMeans(log, null)[5].meanDbHz.toFixed(1));
  plots()[3].focus();
  await userEvent.keyboard("{Home}{Shift>}{ArrowRight}{/Shift}");
  await userEvent.click(screen.getByRole("button", { name: /^Leave out from/ }));
  expect(high()).toBe(
    plain((bandMeans(log, [10, log.readings - 1])[5].meanDbHz || NaN).toFixed(1)).replace("NaN", "–"),
  );
  await userEvent.click(screen.getByRole("button", { name: "Leave nothing out" }));
  expect(high()).toBe(bandMeans(log, null)[5].meanDbHz.toFixed(1));
});

test("no curve holds a number that is none", () => {
  const { container } = render(<Workspace view={view} filesAddress="/files" />);
  expect(container.innerHTML).not.toMatch(/NaN|undefined/);
});
