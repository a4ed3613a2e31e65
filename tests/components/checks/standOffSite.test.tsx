// @vitest-environment jsdom
import { cleanup, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, test } from "vitest";
import { Workspace } from "@/components/checks/Workspace";
import { standOff } from "@/lib/checks/stand-off/standOff";
import { planOf, seedOf } from "@/tests/checks/planOf";
import { expectNear } from "@/tests/support/expectNear";

afterEach(cleanup);

const { publicCase } = standOff.build(seedOf(4), planOf(standOff));
const data = publicCase.data as { satellites: { prn: number; cn0DbHz: number }[]; exponent: number; screenDb: number };

test("every satellite stands in the table with its C/N0", () => {
  render(<Workspace view={publicCase} filesAddress="" />);
  for (const { prn, cn0DbHz } of data.satellites) {
    const row = screen.getByRole("rowheader", { name: `PRN ${prn}` }).parentElement!;
    expect(row.textContent).toContain(`${cn0DbHz.toFixed(1)}\u00a0dB-Hz`);
  }
});

// Free space at 1 m on L1 is 36.4 dB (20 log(4 pi f/c), textbook); the exponent sets the dB of each tenfold distance.
test("the loss of the path stands in a table as well", async () => {
  render(<Workspace view={publicCase} filesAddress="" />);
  await userEvent.click(screen.getByRole("button", { name: /table/i }));
  const cells = [...document.querySelectorAll(".plot-table td")].map((cell) => cell.textContent);
  const first = cells.indexOf("1.0");
  expectNear(Number(cells[first + 1]), 36.4 + data.screenDb, 0.06, "loss at 1 m, dB");
});
