// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { Bench } from "@/app/(public)/bench/_components/Bench";
import { CALCULATORS } from "@/lib/calculators/calculators";

beforeEach(() => {
  localStorage.clear();
  history.replaceState(null, "", "/bench");
  vi.stubGlobal("scrollTo", () => {});
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const opened = (query: string) => {
  history.replaceState(null, "", `/bench${query === "" ? "" : `?${query}`}`);
  return render(<Bench asked={query} />);
};
const field = (name: RegExp) => screen.getByRole<HTMLInputElement>("textbox", { name });

/** The address is written a moment after the change. */
const settled = () => vi.waitFor(() => expect(location.search).toMatch(/=.*=/), { timeout: 2000 });

test("lists every calculator by number and question, one of them open", () => {
  opened("");
  const list = within(screen.getByRole("navigation", { name: "Calculators" }));
  for (const { number, name, question } of CALCULATORS)
    expect(list.getByRole("link", { name: new RegExp(`K${number}\\s*${name}`) }).textContent).toContain(question);
  expect(list.getAllByRole("link", { current: "page" })).toHaveLength(1);
  expect(screen.getAllByRole("heading", { level: 1 })).toHaveLength(1);
});

test("a link's inputs stand in the fields, and win over what the device remembers", () => {
  localStorage.setItem("lagmark.bench.two-codes", "open=two-codes&a=1&b=2");
  opened("open=two-codes&a=5&b=4&doppler=1000");
  expect(field(/Code a/).value).toBe("5");
  expect(field(/Doppler/).value).toBe("+1\u2009000");
});

test("what was typed last on this device comes back, until the start values are asked for", async () => {
  const user = userEvent.setup();
  opened("open=two-codes");
  await user.clear(field(/Code a/));
  await user.type(field(/Code a/), "12{Enter}");
  await settled();
  expect(new URLSearchParams(location.search).get("a")).toBe("12");
  cleanup();

  opened("open=two-codes");
  expect(field(/Code a/).value).toBe("12");
  await user.click(screen.getByRole("button", { name: "Start values" }));
  expect(field(/Code a/).value).toBe("7");
  expect(localStorage.getItem("lagmark.bench.two-codes")).toBeNull();
  expect(location.search).toBe("?open=two-codes");
});

test("a figure out of range is refused with the reason, and the last good one stays in force", async () => {
  const user = userEvent.setup();
  opened("open=two-codes&a=5&b=4");
  await user.clear(field(/Code a/));
  await user.type(field(/Code a/), "40{Enter}");
  expect(screen.getByText(/The range is 1 to 32\. These are the satellites/)).toBeTruthy();
  expect(screen.getByRole("application").getAttribute("aria-label")).toContain("code 5 against code 4");
});

test("what a link says wrongly is named, and the rest of it is taken", () => {
  opened("open=two-codes&a=99&b=4");
  expect(screen.getByText(/Not all of the link could be taken/)).toBeTruthy();
  expect(field(/Code a/).value).toBe("7");
  expect(field(/Code b/).value).toBe("4");
});

test("both copies carry every input", async () => {
  const user = userEvent.setup();
  opened("open=two-codes&a=5&b=4&doppler=1000");
  await user.click(screen.getByRole("button", { name: "Copy the link" }));
  expect(await navigator.clipboard.readText()).toBe(
    `${location.origin}/bench?open=two-codes&a=5&b=4&doppler=1000&coherent=1`,
  );
  await user.click(screen.getByRole("button", { name: "Copy as module text" }));
  expect(await navigator.clipboard.readText()).toBe('<TwoCodes a={5} b={4} doppler="1000 Hz" coherent="1 ms" />');
});

test("another calculator opens without leaving the page, and the list comes back", async () => {
  const user = userEvent.setup();
  vi.stubGlobal(
    "Worker",
    class {
      addEventListener() {}
      postMessage() {}
      terminate() {}
    },
  );
  opened("open=two-codes");
  await user.click(screen.getByRole("link", { name: /Search planner/ }));
  expect(location.search).toBe("?open=search-plan");
  expect(screen.getByRole("heading", { level: 1 }).textContent).toBe("Search planner");
  await user.click(screen.getByRole("link", { name: "All calculators" }));
  expect(location.search).toBe("");
  expect(screen.getByRole("heading", { level: 1 }).textContent).toBe("Bench");
});
