import { Notice } from "@/components/ui/Notice";
import type { Taken } from "./takeReading";

/** Where the last reading went, beside the key that took it: the answers may be on another step. */
export function TakenLine({ taken, kind }: { taken: readonly Taken[] | null; kind: string }) {
  if (taken?.length === 0) {
    return (
      <Notice tone="caution" fact="Nothing was written." className="mt-4" live>
        Enter the answer field that this reading belongs to, then take it.
        {kind === "false-lock" &&
          " For the satellite whose verdict you gave as cross-correlation the fields of the false lock are filled at once."}
      </Notice>
    );
  }
  return (
    <p role="status" className="mt-4 text-dense text-ink-2 figures">
      {taken && `Written: ${taken.map(({ label, value }) => `${label} ${value}`).join(", ")}.`}
    </p>
  );
}
