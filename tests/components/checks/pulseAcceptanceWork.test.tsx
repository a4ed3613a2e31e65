// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { PulseAcceptanceWork } from "@/components/checks/PulseAcceptanceWork";

beforeEach(() => {
  vi.stubGlobal(
    "Worker",
    class {
      addEventListener() {}
      postMessage() {}
      terminate() {}
    },
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

/** 20 ns all day, but one reading of 700; leads of 5 ns. */
const data = {
  readingsNs: Array.from({ length: 300 }, (_, n) => (n === 3 ? 700 : 25)),
  intervalS: 30,
  limitNs: 40,
  clock: "PRTC-B",
};
const tag = () => document.querySelector(".plot-tag")!.textContent;

test("what is taken off moves every reading; a reading is left out and put back by keyboard", async () => {
  const user = userEvent.setup();
  render(<PulseAcceptanceWork data={data} />);
  const off = screen.getByLabelText("Taken off each reading");
  await user.clear(off);
  await user.type(off, "5{Enter}");
  screen.getAllByRole("application")[0].focus();
  await user.keyboard("{Home}{ArrowRight}{ArrowRight}{ArrowRight}");
  expect(tag()).toBe("1.5 min\n+695.0 ns");
  await user.click(screen.getByRole("button", { name: "Leave the reading at 1.5 min out" }));
  expect(tag()).toBe("1.5 min\nleft out");
  expect(screen.getByText("1 reading left out")).toBeTruthy();
  await user.click(screen.getByRole("button", { name: "Put the reading at 1.5 min back" }));
  expect(screen.getByText("0 readings left out")).toBeTruthy();
});

test("time and level at the cursor are taken", async () => {
  const user = userEvent.setup();
  const onTake = vi.fn();
  render(<PulseAcceptanceWork data={data} onTake={onTake} />);
  screen.getAllByRole("application")[0].focus();
  await user.keyboard("{Home}{ArrowRight}{Enter}");
  expect(onTake).toHaveBeenLastCalledWith({ timeS: 30, levelNs: 25 });
  expect(screen.getByRole("button", { name: "Take 0.5 min" })).toBeTruthy();
});
