"use client";
import { useEffect, useMemo, useRef } from "react";
import { useTheme } from "@/components/ui/useTheme";
import { heatAt, heatPlace, rgbOf, type HeatRamp } from "./heat";
import { mergeCells, type Cells } from "./mergeCells";

/** Narrowest column and row on the screen; finer grids merge into them. */
const CELL_PX = { across: 4, up: 1 };
const STOPS = [0, 1, 2, 3, 4, 5];
const COLOURS = 256;

type GridCellsProps = {
  cells: Cells;
  ramp: HeatRamp;
  place: { left: number; top: number; width: number; height: number };
};

/** The cells of a grid as rectangles, without interpolation, in the heat ramp of the theme. */
export function GridCells({ cells, ramp, place }: GridCellsProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const theme = useTheme();
  const mostColumns = Math.max(1, Math.floor(place.width / CELL_PX.across));
  const mostRows = Math.max(1, Math.floor(place.height / CELL_PX.up));
  const shown = useMemo(() => mergeCells(cells, mostRows, mostColumns), [cells, mostRows, mostColumns]);
  const { power, columns } = shown;
  const rows = power.length / columns;

  useEffect(() => {
    const context = canvas.current?.getContext("2d");
    if (!context || !theme) return;
    const style = getComputedStyle(document.documentElement);
    const stops = STOPS.map((stop) => {
      // A style sheet may shorten a colour; the canvas gives it back in full.
      context.fillStyle = style.getPropertyValue(`--heat-${stop}`).trim();
      return rgbOf(String(context.fillStyle));
    });
    const colours = Array.from({ length: COLOURS }, (_, at) => heatAt(stops, at / (COLOURS - 1)));
    const image = context.createImageData(columns, rows);
    for (let row = 0; row < rows; row++) {
      for (let column = 0; column < columns; column++) {
        const level = Math.round(heatPlace(power[row * columns + column], ramp) * (COLOURS - 1));
        const [red, green, blue] = colours[Math.min(COLOURS - 1, Math.max(0, level))];
        // The first row stands at the foot, rows of an image go down.
        const at = ((rows - 1 - row) * columns + column) * 4;
        image.data[at] = red;
        image.data[at + 1] = green;
        image.data[at + 2] = blue;
        image.data[at + 3] = 255;
      }
    }
    context.putImageData(image, 0, 0);
  }, [power, columns, rows, ramp, theme]);

  return <canvas ref={canvas} width={columns} height={rows} className="plot-canvas" style={place} aria-hidden />;
}
