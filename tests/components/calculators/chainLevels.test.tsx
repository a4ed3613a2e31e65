// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { afterEach, expect, test } from "vitest";
import { ChainLevels } from "@/components/calculators/ChainLevels";
import { startValues, type Row, type ValuesOf } from "@/lib/calculators/calculator";
import { CHAIN_LEVELS } from "@/lib/calculators/chainLevels";

afterEach(cleanup);

type Values = ValuesOf<typeof CHAIN_LEVELS>;
const part = (name: string, ...figures: (number | null)[]): Row => ({ name, figures });

function Chain(start: Partial<Values>) {
  const [values, setValues] = useState<Values>({ ...startValues(CHAIN_LEVELS), ...start });
  return <ChainLevels values={values} onChange={setValues} />;
}
const reading = (label: string) => screen.getByText(label).parentElement!.textContent;
const verdicts = () => screen.getAllByRole("status").map(({ textContent }) => textContent);

// Friis's law: a loss in front adds to the noise figure in full. -158.5 dBW at 130 K and 3.1 dB are 43.7 dB-Hz: values of a
// second program.
test("gain and C/N0 of a chain", () => {
  const parts = [part("filter", -1.1, null, null, 0, 0, 0), part("amplifier", 30, 2, null, 0, 0, 0)];
  render(<Chain parts={parts} receiverNoiseDb={0} antennaK={130} signalDbm={-128.5} />);
  expect(reading("Net gain")).toContain("+28.9 dB");
  expect(reading("C/N0 of the satellite")).toContain("43.7 dB-Hz");
  expect(reading("C/N0 of the satellite")).toContain("3.10 dB");
  expect(verdicts()).toEqual(["Gain, levels and feed hold"]);
});

// Ohm's law by hand: 30 mA through 10 + 0.5 + 4 ohm leave 4.565 V of 5 V.
test("the feed loses its voltage on the way up", () => {
  const parts = [
    part("amplifier", 30, 1, null, 30, 4.6, 0),
    part("cable", -4, null, null, 0, 0, 4),
    part("arrester", 0, null, null, 0, 0, 0.5),
  ];
  render(<Chain parts={parts} supplyV={5} sourceOhm={10} />);
  expect(reading("Least voltage at a part")).toContain("4.57 V");
  expect(verdicts()).toEqual(["Amplifier gets too little voltage"]);
});

test("a part that blocks direct current leaves the amplifier dark", () => {
  render(<Chain parts={[part("amplifier", 30, 1, null, 30, 3, 0), part("filter", -1, null, null, 0, 0, null)]} />);
  expect(verdicts()).toEqual(["Amplifier gets no feed"]);
});

// Definition of the 1 dB point: -23 dBm and 28 dB stand 1 dB above +4 dBm.
test("a neighbour drives the amplifier too far, and too much gain is said too", () => {
  const parts = [part("amplifier", 28, 1.2, 4, 0, 0, 0), part("second", 20, 3, null, 0, 0, 0)];
  const { container } = render(<Chain parts={parts} strongDbm={-23} />);
  expect(reading("Least headroom")).toContain("\u22121.0 dB");
  expect(verdicts()).toEqual(["Amplifier is driven beyond its 1 dB point", "Too much gain for the receiver"]);
  expect(container.querySelectorAll('[data-mark="passed"]')).toHaveLength(1);
});

test("parts are added, moved, renamed and taken out", async () => {
  const user = userEvent.setup();
  render(<Chain parts={[part("cable", -12, null, null, 0, 0, 0), part("amplifier", 26, 2, null, 0, 0, 0)]} />);
  const before = reading("C/N0 of the satellite");
  await user.click(screen.getByRole("button", { name: "Move amplifier up" }));
  expect(reading("C/N0 of the satellite")).not.toBe(before);
  await user.click(screen.getByRole("button", { name: "Add a part" }));
  const name = screen.getByRole<HTMLInputElement>("textbox", { name: "Part 3" });
  expect(name.value).toBe("part 3");
  await user.clear(name);
  await user.type(name, "a;b{Tab}");
  expect(screen.getByText(/letters without/)).toBeTruthy();
  await user.clear(name);
  await user.type(name, "splitter{Tab}");
  await user.click(screen.getByRole("button", { name: "Take splitter out" }));
  expect(screen.queryByRole("textbox", { name: "Part 3" })).toBeNull();
});
