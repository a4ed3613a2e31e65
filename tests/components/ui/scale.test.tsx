// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { Menu } from "@/components/ui/Menu";
import { Scale } from "@/components/ui/Scale";
import { currentStation } from "@/components/ui/Stations";

afterEach(cleanup);

const STATIONS = [
  { href: "/firm", label: "Desk" },
  { href: "/firm/checks", label: "Checks" },
];

test.each([
  ["/firm/checks", "/firm/checks"],
  ["/firm/checks/42", "/firm/checks"],
  ["/firm", "/firm"],
  ["/firm/checksum", "/firm"],
  ["/elsewhere", undefined],
])("at %s the current station is %s", (path, station) => expect(currentStation(STATIONS, path)).toBe(station));

test("a page under no station belongs to the one that covers it, but to its own station first", () => {
  const checks = { href: "/firm/checks", label: "Checks", covers: ["/firm/cases", "/firm/sittings"] };
  const sittings = { href: "/firm/sittings", label: "Sittings" };
  expect(currentStation([checks], "/firm/cases/7")).toBe("/firm/checks");
  expect(currentStation([checks, sittings], "/firm/sittings/7")).toBe("/firm/sittings");
});

test("the current station is marked for a screen reader and by a block", () => {
  const { container } = render(<Scale stations={STATIONS} current="/firm/checks" />);
  const marked = [...container.querySelectorAll("[aria-current=page]")].map((element) => element.textContent);
  expect(new Set(marked)).toEqual(new Set(["Checks"]));
  expect(container.querySelectorAll(".station-block")).toHaveLength(1);
});

test("a menu closes by Escape and gives the focus back", async () => {
  const { container } = render(
    <Menu label="Menu" look="key">
      <a href="#x">Trail</a>
    </Menu>,
  );
  const details = container.querySelector("details")!;
  details.open = true;
  screen.getByText("Trail").focus();
  await userEvent.keyboard("{Escape}");
  expect(details.open).toBe(false);
  expect(document.activeElement).toBe(container.querySelector("summary"));
});

test("a menu closes when somebody presses elsewhere", async () => {
  const { container } = render(
    <>
      <Menu label="Menu" look="key">
        <p>Trail</p>
      </Menu>
      <p>elsewhere</p>
    </>,
  );
  const details = container.querySelector("details")!;
  details.open = true;
  await userEvent.click(screen.getByText("Trail"));
  expect(details.open).toBe(true);
  await userEvent.click(screen.getByText("elsewhere"));
  expect(details.open).toBe(false);
});
