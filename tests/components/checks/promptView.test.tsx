// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { Workspace } from "@/components/checks/Workspace";
import { cn0 } from "@/lib/checks/cn0/cn0";
import { planOf, seedOf } from "@/tests/checks/planOf";

afterEach(cleanup);

const { publicCase: view, truth } = cn0.build(seedOf(1), planOf(cn0));
const shown = () => render(<Workspace view={view} filesAddress="/files" />);
const rows = () =>
  screen.getAllByRole("row").map((row) => [...row.children].map((cell) => cell.textContent!.replace("\u2212", "-")));

test("shows I and Q of the first channel, 200 ms of it, and of another when it is chosen", async () => {
  shown();
  expect(screen.getByRole("heading", { name: `I and Q of channel 1, PRN ${truth.channels[0]!.prn}` })).toBeTruthy();
  await userEvent.click(screen.getByRole("radio", { name: "3" }));
  expect(screen.getByRole("heading", { name: `I and Q of channel 3, PRN ${truth.channels[2]!.prn}` })).toBeTruthy();
  expect(screen.getByRole("img", { name: /^Q against I of PRN .* 200 prompts from 0 to 200 ms\.$/ })).toBeTruthy();
});

test("the slider moves both plots on, and the table holds the prompts themselves", async () => {
  shown();
  screen.getByRole("slider").focus();
  await userEvent.keyboard("{ArrowRight}{ArrowRight}");
  await userEvent.click(screen.getAllByRole("button", { name: "Values as a table" })[1]!);
  const { prompts } = truth.channels[0]!;
  expect(rows()).toHaveLength(201);
  expect(rows()[1]!.map(Number)).toEqual([20, prompts[40], prompts[41]]);
  expect(screen.getByRole("img").querySelector("path[stroke-linecap]")!.getAttribute("d")!.match(/M/g)).toHaveLength(
    200,
  );
});

test("nothing is estimated for the technician", () => {
  const { container } = shown();
  expect(container.textContent).not.toMatch(/dB/);
});
