/** What a person takes from a plot into the open answer field. */
export type Reading = {
  prn?: number;
  codePhaseChips?: number;
  dopplerHz?: number;
  cn0DbHz?: number;
  lagChips?: number;
  magnitude?: number;
  binHz?: number;
  timeNs?: number;
  timeS?: number;
  levelNs?: number;
  centreKhz?: number;
  widthKhz?: number;
  levelDb?: number;
  floorDb?: number;
  periodUs?: number;
  eastM?: number;
  northM?: number;
  semiMajorM?: number;
  semiMinorM?: number;
  azimuthDeg?: number;
  /** hh:mm:ss */
  utc?: string;
};
