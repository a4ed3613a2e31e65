const MM = 72 / 25.4;
export const mm = (lengthMm: number) => lengthMm * MM;

/** A4 with the margins of the print rules: 17 mm sides, 13 mm head, 9 mm foot. */
export const PAGE = { side: mm(17), head: mm(13), foot: mm(9), width: mm(210 - 2 * 17) } as const;

/** Print colours: black ink and no tint; blue above the line, vermilion below, told apart by place in greyscale. */
export const INK = { ink: "#000000", quiet: "#33424D", plus: "#12409F", minus: "#C23A14", rule: "#7A868D" } as const;

/** How closely a page is set, in points; `name` is the largest size of the holder's name. The loosest that gives one page is taken. */
export type Density = {
  text: number;
  small: number;
  row: number;
  gap: number;
  title: number;
  panel: number;
  name: number;
};
export const DENSITIES: readonly Density[] = [
  { text: 10.5, small: 9, row: 17.5, gap: 12, title: 23, panel: 10, name: 44 },
  { text: 10, small: 8.5, row: 15.5, gap: 9, title: 21, panel: 8, name: 44 },
  { text: 9.5, small: 8.5, row: 14, gap: 7, title: 19, panel: 7, name: 44 },
  { text: 9, small: 8, row: 12.5, gap: 5, title: 17, panel: 6, name: 40 },
  { text: 8.5, small: 8, row: 11, gap: 4, title: 15, panel: 5, name: 34 },
  { text: 8.5, small: 8, row: 10.5, gap: 3, title: 14, panel: 4, name: 30 },
  { text: 8, small: 8, row: 10, gap: 3, title: 13, panel: 4, name: 28 },
];
