// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, expect, test, vi } from "vitest";
import { AxisSlider } from "@/components/plots/AxisSlider";
import { installPointerEvent } from "../../support/pointerEvent";

beforeAll(installPointerEvent);
afterEach(cleanup);

const slider = (value: number, changed = vi.fn()) => {
  render(
    <AxisSlider
      label="Stronger by"
      unit="dB"
      from={-10}
      to={40}
      step={0.1}
      value={value}
      onChange={changed}
      decimals={1}
      signed
    />,
  );
  return changed;
};

test("is named with its unit and speaks its value", () => {
  slider(18);
  const thumb = screen.getByRole("slider", { name: "Stronger by, dB" });
  expect(thumb.getAttribute("aria-valuetext")).toBe("+18.0 dB");
});

test.each([
  ["{ArrowRight}", 18.1],
  ["{ArrowLeft}", 17.9],
  ["{ArrowUp}", 18.1],
  ["{Shift>}{ArrowRight}{/Shift}", 19],
  ["{PageUp}", 23],
  ["{PageDown}", 13],
  ["{Home}", -10],
  ["{End}", 40],
])("%s sets %d, without what arithmetic leaves behind", async (keys, value) => {
  const changed = slider(18);
  await userEvent.tab();
  await userEvent.keyboard(keys);
  expect(changed).toHaveBeenCalledWith(value);
});

test("stays inside its range", async () => {
  const changed = slider(38);
  await userEvent.tab();
  await userEvent.keyboard("{PageUp}");
  expect(changed).toHaveBeenCalledWith(40);
});

test("a pointer on the scale sets the value under it", () => {
  const changed = slider(18);
  // 640 px wide until measured, margins of 12 px: the middle of the scale is +15.
  fireEvent.pointerDown(screen.getByRole("slider").parentElement!, { clientX: 320, buttons: 1 });
  expect(changed).toHaveBeenCalledWith(15);
});
