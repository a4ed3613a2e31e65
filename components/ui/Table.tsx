import Link from "next/link";
import type { ReactNode } from "react";
import { classNames } from "./classNames";
import { ScrollRegion } from "./ScrollRegion";

type TableProps = {
  caption: string;
  showCaption?: boolean;
  children: ReactNode;
  fixedFirst?: boolean;
  /** On a phone every row becomes a block: its head, then label and value line by line. Its cells carry labels. */
  reflow?: boolean;
  className?: string;
};

/**
 * Words left, figures right, unit in the head or the cell but never in both. Scrolls in its own region when it must.
 * Roles are written out: a table that reflows is no table to a browser that goes by how it is drawn.
 */
export function Table({ caption, showCaption, fixedFirst, reflow, children, className }: TableProps) {
  return (
    <ScrollRegion label={caption} fixedFirst={fixedFirst} className={className}>
      <table role="table" className="table" data-reflow={reflow || undefined}>
        <caption className={showCaption ? "pb-2 text-left text-label" : "sr-only"}>{caption}</caption>
        {children}
      </table>
    </ScrollRegion>
  );
}

/** Head cell. With `sort` it is a link to the same page in another order. */
export function Th({
  figure,
  sort,
  children,
  className,
}: {
  figure?: boolean;
  sort?: Sort;
  children?: ReactNode;
  className?: string;
}) {
  const order = sort?.order === "up" ? "ascending" : sort?.order === "down" ? "descending" : "none";
  return (
    <th
      scope="col"
      role="columnheader"
      className={classNames(figure && "figure", className)}
      aria-sort={sort ? order : undefined}
    >
      {sort ? (
        <Link
          href={sort.href}
          className="inline-flex min-h-[28px] items-end gap-1.5 underline-offset-4 hover:underline"
        >
          {sort.order && <span aria-hidden>{sort.order === "up" ? "▲" : "▼"}</span>}
          {children}
        </Link>
      ) : (
        children
      )}
    </th>
  );
}

export type Sort = { href: string; order: "up" | "down" | null };

/** Row; a wash marks the whole row, and a row with a reason under it is joined to it. */
export function Tr({
  wash,
  joined,
  children,
}: {
  wash?: "plus" | "minus" | "caution" | null;
  joined?: boolean;
  children: ReactNode;
}) {
  return (
    <tr role="row" data-wash={wash ?? undefined} data-joined={joined || undefined}>
      {children}
    </tr>
  );
}

/** First cell of a row, which names it. */
export function RowHead({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <th scope="row" role="rowheader" className={className}>
      {children}
    </th>
  );
}

/** `label` repeats the head of the column where the table reflows. */
export function Td({
  figure,
  label,
  colSpan,
  children,
  className,
}: {
  figure?: boolean;
  label?: string;
  colSpan?: number;
  children?: ReactNode;
  className?: string;
}) {
  return (
    <td role="cell" colSpan={colSpan} data-label={label} className={classNames(figure && "figure", className)}>
      {children}
    </td>
  );
}

/** The reason of the row above, in the same wash. `skip` leaves that many cells free at the left. */
export function ReasonRow({
  columns,
  skip = 0,
  label = "Reason",
  wash,
  children,
}: {
  columns: number;
  skip?: number;
  label?: string;
  wash?: "plus" | "minus" | "caution";
  children: ReactNode;
}) {
  return (
    <tr className="reason" data-wash={wash}>
      {skip > 0 && <td colSpan={skip} />}
      <td colSpan={columns - skip} className={wash === "minus" ? "text-minus-deep" : "text-ink-2"}>
        <strong className="mr-2 font-semibold">{label}</strong>
        {children}
      </td>
    </tr>
  );
}

/** A group begins with an ink line and a plate name. */
export function GroupRow({ columns, children }: { columns: number; children: ReactNode }) {
  return (
    <tr className="group">
      <th scope="rowgroup" colSpan={columns} className="plate text-h3">
        {children}
      </th>
    </tr>
  );
}
