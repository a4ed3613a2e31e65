// @vitest-environment jsdom
import { act, cleanup, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { TimeLeft } from "@/components/ui/TimeLeft";

beforeEach(() => {
  vi.useFakeTimers({ toFake: ["setInterval", "clearInterval", "performance", "Date"] });
});
afterEach(() => {
  cleanup();
  vi.useRealTimers();
});

const START = "2026-03-12T14:12:00Z";
const wait = (ms: number) => act(() => void vi.advanceTimersByTime(ms));

test("changes each ten seconds, and each second in the last minute", () => {
  render(<TimeLeft serverNow={START} endsAt="2026-03-12T14:14:00Z" minutes={60} />);
  expect(screen.getByText("02:00")).toBeTruthy();
  wait(3_000);
  expect(screen.getByText("02:00")).toBeTruthy();
  wait(8_000);
  expect(screen.getByText("01:50")).toBeTruthy();
  wait(51_500);
  expect(screen.getByText("00:58")).toBeTruthy();
  wait(1_000);
  expect(screen.getByText("00:57")).toBeTruthy();
});

test("says once that the last minute has begun, and then that it is over", () => {
  const ended = vi.fn();
  const { container } = render(<TimeLeft serverNow={START} endsAt="2026-03-12T14:14:00Z" minutes={60} onEnd={ended} />);
  const spoken = () => container.querySelector("[aria-live=assertive]")!.textContent;
  expect(spoken()).toBe("");
  wait(61_000);
  expect(spoken()).toBe("One minute left.");
  wait(60_000);
  expect(spoken()).toBe("The time is over.");
  expect(ended).toHaveBeenCalledTimes(1);
});

test("runs by the server's time, not by the device's", () => {
  vi.setSystemTime(Date.parse("2019-01-01T00:00:00Z"));
  render(<TimeLeft serverNow={START} endsAt="2026-03-12T14:42:00Z" minutes={60} />);
  expect(screen.getByText("30:00")).toBeTruthy();
});
