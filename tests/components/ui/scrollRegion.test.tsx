// @vitest-environment jsdom
import { act, cleanup, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { ScrollRegion } from "@/components/ui/ScrollRegion";

// WCAG 2.2, 2.1.1 (keyboard) and 4.1.2 (name, role, value): what scrolls is reached with the keys and says what it is.

let measured: () => void;
beforeEach(() => {
  // jsdom lays nothing out: the widths are given, and the observer answers when the test asks it to.
  vi.stubGlobal(
    "ResizeObserver",
    class {
      constructor(answer: () => void) {
        measured = answer;
      }
      observe() {}
      disconnect() {}
    },
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function laidOut(contentPx: number, placePx: number) {
  const region = screen.getByText("rows").parentElement!;
  Object.defineProperty(region, "scrollWidth", { configurable: true, value: contentPx });
  Object.defineProperty(region, "clientWidth", { configurable: true, value: placePx });
  act(measured);
  return region;
}

test("what is wider than its place is a named stop of the Tab key, and none once there is room", () => {
  render(
    <ScrollRegion label="Sittings">
      <p>rows</p>
    </ScrollRegion>,
  );
  expect(laidOut(700, 358)).toBe(screen.getByRole("region", { name: "Sittings" }));
  expect(screen.getByRole("region").tabIndex).toBe(0);
  const region = laidOut(700, 700);
  expect(screen.queryByRole("region")).toBeNull();
  expect(region.hasAttribute("tabindex")).toBe(false);
});
