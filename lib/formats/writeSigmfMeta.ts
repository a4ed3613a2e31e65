import { sampleFormatName } from "./sampleFormat";
import type { SigmfMeta } from "./sigmfMeta";

/** The text of a `.sigmf-meta` file; `readSigmfMeta` reads the same from it. */
export function writeSigmfMeta(meta: SigmfMeta): string {
  const whole = {
    global: held({
      "core:datatype": sampleFormatName(meta.format),
      "core:version": meta.version,
      "core:sample_rate": meta.sampleRateHz,
      "core:num_channels": meta.channels,
      "core:sha512": meta.sha512,
      "core:dataset": meta.dataset,
      "core:trailing_bytes": meta.trailingBytes || null,
      ...meta.more,
    }),
    captures: meta.captures.map((capture) =>
      held({
        "core:sample_start": capture.sampleStart,
        "core:frequency": capture.frequencyHz,
        "core:datetime": capture.datetime,
        "core:header_bytes": capture.headerBytes || null,
        ...capture.more,
      }),
    ),
    annotations: meta.annotations.map((annotation) =>
      held({
        "core:sample_start": annotation.sampleStart,
        "core:sample_count": annotation.sampleCount,
        "core:freq_lower_edge": annotation.lowerEdgeHz,
        "core:freq_upper_edge": annotation.upperEdgeHz,
        "core:label": annotation.label,
        ...annotation.more,
      }),
    ),
  };
  return `${JSON.stringify(whole, null, 2)}\n`;
}

/** What is not said is left out. */
const held = (fields: Record<string, unknown>) =>
  Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== null && value !== undefined));
