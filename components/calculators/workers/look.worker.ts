import { lookAt, type Look, type LookSettings } from "../lookAt";

export type LookRequest =
  { kind: "capture"; samples: Int8Array; rateHz: number } | { kind: "look"; run: number; settings: LookSettings };
export type LookAnswer = { run: number; look: Look };

let capture: { samples: Int8Array; rateHz: number } | null = null;

addEventListener("message", ({ data }: MessageEvent<LookRequest>) => {
  if (data.kind === "capture") capture = { samples: data.samples, rateHz: data.rateHz };
  else if (capture) {
    const look = lookAt(capture.samples, capture.rateHz, data.settings);
    postMessage({ run: data.run, look } satisfies LookAnswer, { transfer: [look.spectrogram.power.buffer] });
  }
});
