"use client";
import { useEffect, useMemo, useRef } from "react";
import { useTheme } from "@/components/ui/useTheme";
import { heatAt, heatPlace, rgbOf } from "./heat";
import { mergeCells } from "./mergeCells";

/** Narrowest column on the screen; finer grids merge into it. */
const CELL_PX = 4;
const STOPS = [0, 1, 2, 3, 4, 5];

type GridCellsProps = {
  power: Float32Array;
  columns: number;
  topDb: number;
  place: { left: number; top: number; width: number; height: number };
};

/** The cells of a grid as rectangles, without interpolation, in the heat ramp of the theme. */
export function GridCells({ power, columns, topDb, place }: GridCellsProps) {
  const canvas = useRef<HTMLCanvasElement>(null);
  const theme = useTheme();
  const rows = Math.floor(power.length / columns);
  const shown = Math.max(1, Math.min(columns, Math.floor(place.width / CELL_PX)));
  const cells = useMemo(() => mergeCells(power, columns, shown), [power, columns, shown]);

  useEffect(() => {
    const context = canvas.current?.getContext("2d");
    if (!context || !theme) return;
    const style = getComputedStyle(document.documentElement);
    const stops = STOPS.map((stop) => {
      // A style sheet may shorten a colour; the canvas gives it back in full.
      context.fillStyle = style.getPropertyValue(`--heat-${stop}`).trim();
      return rgbOf(String(context.fillStyle));
    });
    const image = context.createImageData(shown, rows);
    for (let row = 0; row < rows; row++) {
      for (let column = 0; column < shown; column++) {
        const [red, green, blue] = heatAt(stops, heatPlace(cells[row * shown + column], topDb));
        // Doppler goes up, rows of an image go down.
        image.data.set([red, green, blue, 255], ((rows - 1 - row) * shown + column) * 4);
      }
    }
    context.putImageData(image, 0, 0);
  }, [cells, rows, shown, topDb, theme]);

  return <canvas ref={canvas} width={shown} height={rows} className="plot-canvas" style={place} aria-hidden />;
}
