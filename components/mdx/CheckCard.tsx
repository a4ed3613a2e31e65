import type { ReactNode } from "react";
import { SectionHead } from "@/components/ui/SectionHead";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";

export type CheckCardProps = {
  id: string;
  title?: string;
  minutes?: number;
  needs?: number;
  quantities?: readonly { id: string; label: string; tolerance: string; critical: boolean }[];
  /** State of the check and its key, from the page that shows the module. */
  action?: ReactNode;
  /** The brief. */
  children?: ReactNode;
};

/** A practical check where it stands in the text: what is handed in, how near it must be, and how long it takes. */
export function CheckCard({ id, title, minutes, needs, quantities = [], action, children }: CheckCardProps) {
  return (
    <section aria-label={`Practical check ${id}`} className="my-6">
      <SectionHead level={3} title={title ?? "Practical check"} note={<Facts id={id} minutes={minutes} />} />
      <div className="bg-sheet px-4 pt-1 pb-4">
        {children}
        {quantities.length > 0 && (
          <>
            <Table caption={`What is handed in for ${id}`}>
              <thead>
                <tr>
                  <Th>Quantity</Th>
                  <Th>Tolerance</Th>
                  <Th>
                    <span className="sr-only">Critical</span>
                  </Th>
                </tr>
              </thead>
              <tbody>
                {quantities.map((quantity) => (
                  <Tr key={quantity.id}>
                    <RowHead>{quantity.label}</RowHead>
                    <Td>{quantity.tolerance}</Td>
                    <Td>{quantity.critical && <strong className="font-semibold">Critical</strong>}</Td>
                  </Tr>
                ))}
              </tbody>
            </Table>
            <p className="mt-3 text-dense text-ink-2">{rule(needs ?? quantities.length, quantities)}</p>
          </>
        )}
        {action && <div className="mt-4">{action}</div>}
      </div>
    </section>
  );
}

function Facts({ id, minutes }: { id: string; minutes?: number }) {
  return (
    <>
      <code>{id}</code>
      {minutes !== undefined && <> · {minutes} min from opening the case to the hand-in</>}
    </>
  );
}

function rule(needs: number, quantities: readonly { critical: boolean }[]): string {
  const all = quantities.length;
  const critical = quantities.some((quantity) => quantity.critical) ? "every critical quantity and " : "";
  if (needs >= all)
    return all === 1 ? "Met when the quantity is within." : `Met when all ${all} quantities are within.`;
  return `Met when ${critical}at least ${needs} of the ${all} quantities are within.`;
}
