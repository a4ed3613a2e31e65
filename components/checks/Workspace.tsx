"use client";
import type { ComponentProps } from "react";
import { CaptureLook } from "@/components/calculators/CaptureLook";
import { CaptureSearch } from "@/components/calculators/CaptureSearch";
import type { Reading } from "@/components/calculators/reading";
import { InstrumentLog, type InstrumentData } from "@/components/calculators/InstrumentLog";
import { ReceiverLog } from "@/components/calculators/ReceiverLog";
import { StandingCalculator } from "@/components/calculators/StandingCalculator";
import { TraceReader } from "@/components/calculators/TraceReader";
import { SectionHead } from "@/components/ui/SectionHead";
import type { PublicCase } from "@/lib/checks/kind";
import { ChainSite, type ChainSiteData } from "./ChainSite";
import { DelayEntryWork, type DelayEntryData } from "./DelayEntryWork";
import { PeakTrace, type PeakTraceData } from "./PeakTrace";
import { FormulaWork, WrittenWork } from "./PaperWork";
import { PatrolLog, type PatrolData } from "./PatrolLog";
import { PromptView, type PromptData } from "./PromptView";
import { PulseAcceptanceWork, type PulseAcceptanceData } from "./PulseAcceptanceWork";
import { SkyAndReport, type SkyData } from "./SkyAndReport";
import { SkySurvey, type SkySurveyData } from "./SkySurvey";
import { StandOffSite, type StandOffData } from "./StandOffSite";

type WorkspaceProps = { view: PublicCase; filesAddress: string; onTake?: (reading: Reading) => void };
type CaptureData = {
  captureFile: string;
  rateHz: number;
  windowHz?: number;
  search?: { dopplerHalfWidthHz: number };
};
type LogData = Pick<ComponentProps<typeof ReceiverLog>, "log" | "gainDb" | "currentMa">;
type TraceData = { trace: number[]; stepChips: number };

const ALL_PRNS = Array.from({ length: 32 }, (_, index) => index + 1);

/** The place to work at, by kind of check; an unknown kind has its files and the form. */
export function Workspace({ view, filesAddress, onTake }: WorkspaceProps) {
  switch (view.kind) {
    case "correlator-reading": {
      const { trace, stepChips } = view.data as TraceData;
      return <TraceReader trace={trace} stepChips={stepChips} onTake={onTake} />;
    }
    case "side-peak":
      return <PeakTrace data={view.data as PeakTraceData} onTake={onTake} />;
    case "cn0":
      return <PromptView data={view.data as PromptData} />;
    case "satellites":
    case "false-lock": {
      const { captureFile, rateHz, windowHz, search } = view.data as CaptureData;
      return (
        <div className="grid gap-8">
          {view.kind === "false-lock" && <SkyAndReport data={view.data as SkyData} />}
          <CaptureSearch
            address={`${filesAddress}/${captureFile}`}
            rateHz={rateHz}
            prns={ALL_PRNS}
            windowHz={windowHz ?? search!.dopplerHalfWidthHz}
            onTake={onTake}
          />
        </div>
      );
    }
    case "search-plan":
      return (
        <>
          <SectionHead
            title="Search planner"
            note="the bench's own, to try plans on; your answers are typed at the right"
          />
          <div className="mt-4">
            <StandingCalculator tag="SearchPlan" />
          </div>
        </>
      );
    case "interferer": {
      const { captureFile, rateHz } = view.data as CaptureData;
      return <CaptureLook address={`${filesAddress}/${captureFile}`} rateHz={rateHz} onTake={onTake} />;
    }
    case "stand-off":
      return <StandOffSite data={view.data as StandOffData} />;
    case "chain":
      return <ChainSite data={view.data as ChainSiteData} />;
    case "sky-view":
      return <SkySurvey data={view.data as SkySurveyData} />;
    case "delay-entry":
      return <DelayEntryWork data={view.data as DelayEntryData} onTake={onTake} />;
    case "locate":
      return <PatrolLog data={view.data as PatrolData} onTake={onTake} />;
    case "pulse-acceptance":
      return <PulseAcceptanceWork data={view.data as PulseAcceptanceData} onTake={onTake} />;
    case "jammed-or-not":
      return <InstrumentLog data={view.data as InstrumentData} onTake={onTake} />;
    case "lost-decibels": {
      const { log, gainDb, currentMa } = view.data as LogData;
      return <ReceiverLog log={log} gainDb={gainDb} currentMa={currentMa} onTake={onTake} />;
    }
    case "formula":
      return <FormulaWork />;
    case "written":
      return <WrittenWork />;
    default:
      return <p className="text-dense text-ink-2">Work with the files of this case and type your answers.</p>;
  }
}
