// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test, vi } from "vitest";
import { CheckBox } from "@/components/ui/CheckBox";
import { Field } from "@/components/ui/Field";
import { NumberField, turnedSign } from "@/components/ui/NumberField";
import { RadioRows } from "@/components/ui/RadioRows";
import { Select } from "@/components/ui/Select";
import { TextArea } from "@/components/ui/TextArea";
import { TwoWay } from "@/components/ui/TwoWay";

afterEach(cleanup);

const describedBy = (element: HTMLElement) =>
  (element.getAttribute("aria-describedby") ?? "").split(" ").map((id) => document.getElementById(id)?.textContent);

test("the unit is part of the name of a number field", () => {
  render(<NumberField label="Code phase" unit="chip" />);
  expect(screen.getByRole("textbox", { name: "Code phase chip" }).getAttribute("inputmode")).toBe("decimal");
});

test("help stays when an error appears, and both are tied to the field", () => {
  render(<NumberField label="Code phase" unit="chip" help="0 to 1 022.75" error="A code is 1 023 chips long." />);
  const field = screen.getByRole("textbox");
  expect(field.getAttribute("aria-invalid")).toBe("true");
  expect(describedBy(field)).toEqual(["A code is 1 023 chips long.", "0 to 1 022.75"]);
});

test.each([
  ["a line of text", <Field key="f" label="Site" error="Give the site." />],
  ["several lines", <TextArea key="t" label="Site" error="Give the site." />],
  ["a list", <Select key="s" label="Site" choices={[{ value: "n", label: "North" }]} error="Give the site." />],
])("an error of %s is read with it", (_what, field) => {
  render(field);
  expect(describedBy(screen.getByLabelText("Site"))).toEqual(["Give the site."]);
});

test("an empty number field shows an en dash, which is not a value", () => {
  render(<NumberField label="Cable delay" unit="ns" />);
  const field = screen.getByRole<HTMLInputElement>("textbox");
  expect(field.placeholder).toBe("–");
  expect(field.value).toBe("");
});

test("a number is looked at when the field is left, and its normal form is shown", async () => {
  const left = vi.fn((text: string) => text.replace("-", "\u2212"));
  render(<NumberField label="Doppler" unit="Hz" onLeave={left} />);
  const field = screen.getByRole<HTMLInputElement>("textbox");
  await userEvent.type(field, "-1750");
  expect(left).not.toHaveBeenCalled();
  await userEvent.tab();
  expect(left).toHaveBeenCalledWith("-1750");
  expect(field.value).toBe("\u22121750");
});

test.each([
  ["1750", "\u22121750"],
  ["-1750", "+1750"],
  ["\u22121750", "+1750"],
  ["+12.5", "\u221212.5"],
  ["", "\u2212"],
])("the sign of %j turns to %j", (from, to) => expect(turnedSign(from)).toBe(to));

test("the sign key turns the sign of what stands in the field", async () => {
  const changed = vi.fn();
  render(<NumberField label="Doppler" unit="Hz" signed value="2250" onChange={changed} />);
  await userEvent.click(screen.getByRole("button", { name: "Turn the sign of Doppler" }));
  expect(changed).toHaveBeenCalledWith("\u22122250");
});

test("of two words nothing is chosen until somebody chooses", async () => {
  const chosen = vi.fn();
  const choices = [
    { value: "present", label: "Present" },
    { value: "absent", label: "Absent" },
  ];
  render(<TwoWay name="sat-7" label="Satellite 7" choices={choices} onChange={chosen} />);
  const radios = screen.getAllByRole<HTMLInputElement>("radio");
  expect(radios.map((radio) => radio.checked)).toEqual([false, false]);
  await userEvent.click(screen.getByText("Absent"));
  expect(chosen).toHaveBeenLastCalledWith("absent");
  expect(radios.map((radio) => radio.checked)).toEqual([false, true]);
});

test("the whole row of a decision is its target, and its consequence is part of its name", async () => {
  const chosen = vi.fn();
  const rows = [{ value: "competent", label: "Competent", detail: "A certificate is issued." }];
  render(<RadioRows name="decision" legend="Your decision" rows={rows} onChange={chosen} />);
  await userEvent.click(screen.getByText("A certificate is issued."));
  expect(chosen).toHaveBeenCalledWith("competent");
  expect(screen.getByRole("radio", { name: "Competent A certificate is issued." })).toBeTruthy();
});

test("a statement is made by its words, and its error is read with it", async () => {
  render(<CheckBox label="I did not train this person" error="Say whether you did." />);
  const box = screen.getByRole<HTMLInputElement>("checkbox");
  await userEvent.click(screen.getByText("I did not train this person"));
  expect(box.checked).toBe(true);
  expect(describedBy(box)).toEqual(["Say whether you did."]);
});
