"use client";
import { useState } from "react";
import { CheckBox } from "@/components/ui/CheckBox";
import { formatNumber } from "@/components/ui/formatNumber";
import { Key } from "@/components/ui/Key";
import { RowHead, Table, Td, Th, Tr } from "@/components/ui/Table";
import { TwoWay } from "@/components/ui/TwoWay";
import {
  bearingOffDeg,
  sumOfSquares,
  type BearingLine,
  type Ellipse,
  type Place,
} from "@/lib/gnss/interference/bearingFix";
import { BearingMap, type PatrolStop } from "./BearingMap";
import { FigureField } from "./FigureField";
import type { Reading } from "./reading";
import { Reading as Figure } from "./Reading";

type BearingWorkProps = { stops: readonly PatrolStop[]; onTake?: (reading: Reading) => void };
type HeardStop = PatrolStop & { line: BearingLine };

const CLOSE_M = 500;
const VIEWS = [
  { value: "whole", label: "Whole patrol" },
  { value: "close", label: "500 m about the cursor" },
];
const HALF_AXIS = { from: 1, to: 5000, decimals: 0 };
const DIRECTION = { from: 0, to: 180, decimals: 0 };

/** Bearings of a patrol on a map: how far each misses the cursor, their sum of squares, and an ellipse to lay over it. */
export function BearingWork({ stops, onTake }: BearingWorkProps) {
  const heard = stops.filter((stop): stop is HeardStop => stop.line !== null);
  const [place, setPlace] = useState<Place>(() => middleOf(stops));
  const [leftOut, setLeftOut] = useState<ReadonlySet<number>>(new Set());
  const [view, setView] = useState("whole");
  const [axes, setAxes] = useState({ semiMajorM: 100, semiMinorM: 50, azimuthDeg: 0 });
  const ellipse: Ellipse = { ...place, ...axes };
  const counted = heard.filter(({ stop }) => !leftOut.has(stop)).map(({ line }) => line);
  const sum = sumOfSquares(counted, place);
  const turn = (stop: number) =>
    setLeftOut((before) => new Set(before.has(stop) ? minus(before, stop) : [...before, stop]));
  const take = onTake && (() => onTake({ ...place, ...axes }));
  return (
    <div className="grid gap-5">
      <TwoWay name="map-view" label="Map" choices={VIEWS} value={view} onChange={setView} />
      <BearingMap
        stops={stops}
        leftOut={leftOut}
        ellipse={ellipse}
        place={place}
        onMove={setPlace}
        onTake={take}
        closeM={view === "close" ? CLOSE_M : undefined}
        summary={`Map of ${stops.length} stops, ${heard.length} of them with a bearing.`}
      />
      <div className="grid gap-4 tablet:grid-cols-2">
        <Figure label="Cursor" value={`${formatNumber(place.eastM)} E, ${formatNumber(place.northM)} N`} unit="m" />
        <Figure label={`Sum of squares of ${counted.length} bearings`} value={sum} decimals={2} deciding />
      </div>
      <MissTable heard={heard} place={place} leftOut={leftOut} onTurn={turn} />
      <div className="grid gap-4 tablet:grid-cols-3">
        <FigureField
          label="Long half axis"
          unit="m"
          bounds={HALF_AXIS}
          value={axes.semiMajorM}
          onChange={(semiMajorM) => semiMajorM !== null && setAxes({ ...axes, semiMajorM })}
        />
        <FigureField
          label="Short half axis"
          unit="m"
          bounds={HALF_AXIS}
          value={axes.semiMinorM}
          onChange={(semiMinorM) => semiMinorM !== null && setAxes({ ...axes, semiMinorM })}
        />
        <FigureField
          label="Direction of the long axis"
          unit="deg"
          bounds={DIRECTION}
          value={axes.azimuthDeg}
          onChange={(azimuthDeg) => azimuthDeg !== null && setAxes({ ...axes, azimuthDeg })}
        />
      </div>
      {take && (
        <p>
          <Key onClick={take}>Take place and ellipse</Key>
        </p>
      )}
    </div>
  );
}

type MissTableProps = {
  heard: readonly HeardStop[];
  place: Place;
  leftOut: ReadonlySet<number>;
  onTurn: (stop: number) => void;
};

/** By how much each bearing misses the cursor, in degrees and in its own spreads. */
function MissTable({ heard, place, leftOut, onTurn }: MissTableProps) {
  return (
    <Table caption="How far each bearing misses the cursor">
      <thead>
        <tr>
          <Th>Counts</Th>
          <Th figure>Bearing</Th>
          <Th figure>Spread</Th>
          <Th figure>Miss</Th>
          <Th figure>In spreads</Th>
        </tr>
      </thead>
      <tbody>
        {heard.map(({ stop, line }) => {
          const miss = bearingOffDeg(line, place);
          return (
            <Tr key={stop}>
              <RowHead>
                <CheckBox label={`Stop ${stop}`} checked={!leftOut.has(stop)} onChange={() => onTurn(stop)} />
              </RowHead>
              <Td figure>{formatNumber(line.bearingDeg)}°</Td>
              <Td figure>{formatNumber(line.sigmaDeg)}°</Td>
              <Td figure>{formatNumber(miss, 1, true)}°</Td>
              <Td figure>{formatNumber(miss / line.sigmaDeg, 1, true)}</Td>
            </Tr>
          );
        })}
      </tbody>
    </Table>
  );
}

const minus = (all: ReadonlySet<number>, one: number) => [...all].filter((other) => other !== one);

/** Where the cursor begins: among the stops, in whole steps, which says nothing of the transmitter. */
function middleOf(stops: readonly Place[]): Place {
  const middle = (values: number[]) =>
    Math.round(values.reduce((sum, value) => sum + value, 0) / values.length / 5) * 5;
  return { eastM: middle(stops.map(({ eastM }) => eastM)), northM: middle(stops.map(({ northM }) => northM)) };
}
