"use client";
import { useState } from "react";
import { Key } from "@/components/ui/Key";
import { Notice } from "@/components/ui/Notice";
import { Select } from "@/components/ui/Select";
import { Working } from "@/components/ui/Working";
import { CaptureFailed } from "./CaptureFailed";
import { GridReading } from "./GridReading";
import type { Reading } from "./reading";
import { SearchSettingsFields, type SettingsText } from "./SearchSettingsFields";
import { useCapture } from "./useCapture";
import { useSearch } from "./useSearch";

type CaptureSearchProps = {
  /** Address of the samples, 8-bit I and Q alternating. */
  address: string;
  rateHz: number;
  prns: readonly number[];
  windowHz: number;
  onTake?: (reading: Reading) => void;
};

const FALSE_ALARM_PER_SEARCH = 1e-3;

/** A capture under search: one satellite's grid, a crosshair over it, and the two cuts through the crosshair. */
export function CaptureSearch({ address, rateHz, prns, windowHz, onTake }: CaptureSearchProps) {
  const [again, setAgain] = useState(0);
  const load = useCapture(address, again);
  const { busy, result, refused, search } = useSearch(load.state === "ready" ? load.samples : null, rateHz);
  const [prn, setPrn] = useState(prns[0]!);
  const [text, setText] = useState<SettingsText>({
    coherentMs: "1",
    sums: "10",
    stepHz: "500",
    halfWidthHz: String(windowHz),
  });

  if (load.state === "failed") {
    return <CaptureFailed onAgain={() => setAgain(again + 1)} />;
  }
  if (load.state === "loading") {
    const mb = (bytes: number) => Math.round(bytes / 1e5) / 10;
    return (
      <Working
        label="Loading the capture"
        done={mb(load.doneBytes)}
        total={mb(load.totalBytes) || undefined}
        unit="MB"
      />
    );
  }
  const run = (next: number) => {
    setPrn(next);
    search(next, {
      coherentMs: Number(text.coherentMs),
      sums: Number(text.sums),
      dopplerStepHz: Number(text.stepHz),
      dopplerHalfWidthHz: Number(text.halfWidthHz),
      falseAlarmPerSearch: FALSE_ALARM_PER_SEARCH,
    });
  };
  const beside = (step: number) => prns[(prns.indexOf(prn) + step + prns.length) % prns.length]!;
  return (
    <div className="grid gap-4">
      <form
        className="grid grid-cols-2 items-end gap-3 tablet:flex tablet:flex-wrap"
        onSubmit={(event) => {
          event.preventDefault();
          run(prn);
        }}
      >
        <Select
          label="Satellite"
          value={String(prn)}
          onChange={(event) => setPrn(Number(event.target.value))}
          choices={prns.map((one) => ({ value: String(one), label: `PRN ${one}` }))}
          className="col-span-2 tablet:w-[7.5rem]"
        />
        <SearchSettingsFields value={text} onChange={setText} />
        <div className="col-span-2 grid grid-cols-[auto_1fr_auto] gap-3 tablet:flex">
          <Key onClick={() => run(beside(-1))} busy={busy} aria-label={`Search PRN ${beside(-1)}`}>
            −1
          </Key>
          <Key type="submit" busy={busy}>
            Search PRN {prn}
          </Key>
          <Key onClick={() => run(beside(1))} busy={busy} aria-label={`Search PRN ${beside(1)}`}>
            +1
          </Key>
        </div>
      </form>
      {refused && (
        <Notice tone="minus" fact="These settings cannot be searched.">
          {sentence(refused)}
        </Notice>
      )}
      {busy && !result && <Working label={`Searching PRN ${prn}`} />}
      {result ? (
        <GridReading result={result} onTake={onTake} busy={busy} />
      ) : (
        !busy && <p className="text-dense text-ink-2">Choose a satellite and search it. The grid appears here.</p>
      )}
    </div>
  );
}

/** "search: 4 ms x 40 is longer than ..." without the name of the function. */
const sentence = (message: string) => {
  const rule = message.replace(/^\w+: /, "");
  return `${rule[0]!.toUpperCase()}${rule.slice(1)}.`;
};
