// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, describe, expect, test, vi } from "vitest";
import { lookAt } from "@/components/calculators/lookAt";
import { RepetitionReader } from "@/components/calculators/RepetitionReader";
import { SpectraInTime } from "@/components/calculators/SpectraInTime";
import { SpectrumReader } from "@/components/calculators/SpectrumReader";
import { takeReading } from "@/components/checks/takeReading";
import { Workspace } from "@/components/checks/Workspace";
import { readCapture } from "@/lib/checks/captureFiles";
import { interferer } from "@/lib/checks/interferer/interferer";
import { planOf, seedOf } from "@/tests/checks/planOf";
import { expectNear } from "@/tests/support/expectNear";

afterEach(cleanup);

const plan = planOf(interferer, { nothing: 100 });
const one = interferer.build(seedOf(1), plan);
const { samples, rateHz } = readCapture(one.files);
const look = lookAt(samples, rateHz, { points: 512, rowPoints: 64 });
const key = (name: RegExp | string) => screen.getByRole("button", { name });

describe("a spectrum with nothing in it but the receiver", () => {
  test("floor and own line are read with the marks and taken into the form", async () => {
    const onTake = vi.fn();
    render(<SpectrumReader spectrum={look.spectrum} fullScale={127 * 127} onTake={onTake} />);
    const plot = screen.getByRole("application");
    plot.focus();
    // Ten bins of 16 kHz to the right of 0 Hz the floor, two either side of it the line.
    await userEvent.keyboard("{Shift>}{ArrowRight}{/Shift}");
    await userEvent.click(key("Floor here"));
    plot.focus();
    await userEvent.keyboard("{Shift>}{ArrowLeft}{/Shift}{ArrowLeft}{ArrowLeft}{ArrowLeft}");
    await userEvent.click(key("Edge here"));
    plot.focus();
    await userEvent.keyboard("{ArrowRight}{ArrowRight}{ArrowRight}{ArrowRight}{ArrowRight}{ArrowRight}");
    await userEvent.click(key("Other edge here"));
    await userEvent.click(key("Take floor"));
    await userEvent.click(key("Take middle, width and level"));
    const [floor, line] = onTake.mock.calls.map(([reading]) => reading);
    const { sections } = one.publicCase;
    const taken = [...takeReading(sections, {}, floor, null), ...takeReading(sections, {}, line, "receiver.ownLine")];
    const written = Object.fromEntries(taken.map(({ id, value }) => [id, Number(value.replace("\u2212", "-"))]));
    // One bin of noise scatters; the tolerance of the check is met with the mean of a few.
    expectNear(written["receiver.floor"], Number(interferer.solve(one, plan)["receiver.floor"]), 1.5, "floor, dB");
    expectNear(written["receiver.ownLine"], one.truth.scene.ownLineDb, 1.5, "own line, dB");
  });
});

test("a lag is taken as repetition", async () => {
  const onTake = vi.fn();
  render(<RepetitionReader likeness={look.likeness} onTake={onTake} />);
  screen.getByRole("application").focus();
  await userEvent.keyboard("{ArrowRight}{ArrowRight}");
  await userEvent.click(key(/^Take 0\.24 µs/));
  expectNear(onTake.mock.calls[0][0].periodUs, 2 / 8.184, 1e-9, "lag, us");
});

test("spectra in time say their resolution and read a cell", () => {
  vi.spyOn(HTMLCanvasElement.prototype, "getContext").mockReturnValue(null);
  render(<SpectraInTime inTime={look.inTime} />);
  // 1.5 bins of 8184/64 kHz; 64 samples are 7.8 us.
  expect(screen.getByText(/^Resolution 192 kHz and 7\.8 µs/)).toBeTruthy();
  expect(screen.getByRole("application").getAttribute("aria-label")).toMatch(/kHz, .* µs, .* dB/);
});

test("the workspace loads the capture, and says when it cannot", async () => {
  vi.stubGlobal("fetch", vi.fn().mockResolvedValue({ ok: false, status: 503, body: null }));
  render(<Workspace view={one.publicCase} filesAddress="/files" />);
  expect(await screen.findByText("The capture could not be loaded.")).toBeTruthy();
  vi.unstubAllGlobals();
});
