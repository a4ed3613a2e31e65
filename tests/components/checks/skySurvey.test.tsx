// @vitest-environment jsdom
import { cleanup, render, screen, within } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { Workspace } from "@/components/checks/Workspace";
import { skyView } from "@/lib/checks/sky-view/skyView";
import { planOf, seedOf } from "../../checks/planOf";

afterEach(cleanup);
const { publicCase, truth } = skyView.build(seedOf(2), planOf(skyView));

test("each position has its horizon drawn and as a table, row by row", () => {
  render(<Workspace view={publicCase} filesAddress="/files" />);
  for (const { id, horizon } of truth.roof.positions) {
    expect(
      screen.getByRole("img", { name: new RegExp(`^Sky plot of position ${id}: ${horizon.length} pieces`) }),
    ).toBeTruthy();
    const table = screen.getByRole("table", { name: `Pieces of the horizon of position ${id}` });
    const rows = within(table).getAllByRole("row").slice(1);
    expect(rows.map((row) => row.textContent)).toEqual(
      horizon.map(({ fromDeg, toDeg, topDeg }) => `${fromDeg}°${toDeg}°${topDeg}°`),
    );
  }
});

test("the plan shows every emitter with its keep-out distance, and its table says the same", () => {
  const { container } = render(<Workspace view={publicCase} filesAddress="/files" />);
  const plan = screen.getByRole("img", { name: /^Plan of a roof with 3 positions/ });
  const radii = [...plan.querySelectorAll("circle")].map((circle) => Number(circle.getAttribute("r")) / 10);
  expect(radii).toEqual(truth.roof.emitters.map(({ keepOutM }) => keepOutM));
  const table = screen.getByRole("table", { name: /^Places on the roof/ });
  for (const { name, keepOutM } of truth.roof.emitters) {
    const row = within(table).getByRole("row", { name: new RegExp(name) });
    expect(row.textContent).toContain(keepOutM.toFixed(1));
  }
  expect(container.textContent).not.toMatch(/blocked \d|fits/);
});
