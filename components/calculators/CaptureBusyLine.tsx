"use client";
import { Key } from "@/components/ui/Key";
import { Working } from "@/components/ui/Working";
import type { CaptureBusy } from "./CaptureReader";

/** How far reading or searching is, and the key that stops it. */
export function CaptureBusyLine({ busy, onCancel }: { busy: CaptureBusy; onCancel: () => void }) {
  const reading = busy.step === "read";
  const unit = reading ? 1e6 : 1;
  const shown = (value?: number) => (value === undefined ? undefined : Math.round((10 * value) / unit) / 10);
  return (
    <div className="grid gap-3">
      <Working
        label={reading ? "Reading the file" : "Searching"}
        done={shown(busy.done)}
        total={shown(busy.total)}
        unit={reading ? "MB" : "steps"}
      />
      <p className="no-print">
        <Key size="small" onClick={onCancel}>
          {reading ? "Stop reading" : "Stop the search"}
        </Key>
      </p>
    </div>
  );
}
