import type { SampleFormat } from "./sampleFormat";

/** Version of the SigMF specification that is written. Its schema of the 1.2 line is what the reader holds files against. */
export const SIGMF_VERSION = "1.2.5";

/** A stretch of a recording under one setting of the receiver. */
export type SigmfCapture = {
  sampleStart: number;
  /** What 0 Hz in the samples stands for on the air; null when it is not said. */
  frequencyHz: number | null;
  /** As written; ISO 8601. */
  datetime: string | null;
  /** Bytes before the first sample of this stretch that are none. */
  headerBytes: number;
  /** All else, `core:` and other names, as it stands in the file. */
  more: Readonly<Record<string, unknown>>;
};

/** A remark on some of the samples. */
export type SigmfAnnotation = {
  sampleStart: number;
  /** Null for all that follow. */
  sampleCount: number | null;
  lowerEdgeHz: number | null;
  upperEdgeHz: number | null;
  label: string | null;
  more: Readonly<Record<string, unknown>>;
};

/** What a `.sigmf-meta` file says. */
export type SigmfMeta = {
  format: SampleFormat;
  version: string;
  sampleRateHz: number | null;
  /** Recordings of several channels hold their samples in turn. */
  channels: number;
  /** Of the bytes of the samples, 128 hexadecimal digits in lower case. */
  sha512: string | null;
  /** Name of the file with the samples where it is not that of the metadata. */
  dataset: string | null;
  /** Bytes behind the last sample that are none. */
  trailingBytes: number;
  more: Readonly<Record<string, unknown>>;
  /** In ascending order of their first samples. */
  captures: readonly SigmfCapture[];
  annotations: readonly SigmfAnnotation[];
};
