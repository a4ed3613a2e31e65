// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, describe, expect, test, vi } from "vitest";
import { lookAt } from "@/components/calculators/lookAt";
import { RepetitionReader } from "@/components/calculators/RepetitionReader";
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
const look = lookAt(samples, rateHz, { points: 512, stretchS: 1e-3 });
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

test("the mean between two edges is a floor as well", async () => {
  render(<SpectrumReader spectrum={look.spectrum} fullScale={127 * 127} />);
  const plot = screen.getByRole("application");
  const walk = async (steps: number) => {
    plot.focus();
    await userEvent.keyboard("{Shift>}" + "{ArrowRight}".repeat(steps) + "{/Shift}");
  };
  await walk(3);
  await userEvent.click(key("Edge here"));
  await walk(8);
  await userEvent.click(key("Other edge here"));
  await userEvent.click(key("Floor: mean between the edges"));
  const shown = screen.getByText("Floor in 1 MHz").parentElement!.textContent!.match(/\u2212[\d.]+/)![0];
  // The mean of eighty bins: what was put in, to the tenth that is shown.
  const floorDb = 10 * Math.log10((one.truth.scene.floorPerHz * 1e6) / (127 * 127));
  expectNear(Number(shown.replace("\u2212", "-")), floorDb, 0.3, "floor, dB");
});

test("likeness leaves the receiver's own line out: of noise alone nothing comes back", () => {
  const { magnitude } = look.likeness;
  expect(Math.max(...magnitude.slice(4)) / magnitude[0]).toBeLessThan(0.05);
});

test("the workspace loads the capture, and says when it cannot", async () => {
  vi.stubGlobal("fetch", vi.fn().mockResolvedValue({ ok: false, status: 503, body: null }));
  render(<Workspace view={one.publicCase} filesAddress="/files" />);
  expect(await screen.findByText("The capture could not be loaded.")).toBeTruthy();
  vi.unstubAllGlobals();
});
