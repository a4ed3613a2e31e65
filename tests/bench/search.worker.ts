import { parentPort } from "node:worker_threads";
import { searchSatellites } from "@/lib/gnss/search/searchSatellites";
import { searchSignalOf } from "@/lib/gnss/search/searchSignal";
import { gpsL1Ca } from "@/lib/gnss/signals/gpsL1Ca";
import type { SearchWork } from "./searchWorkers";

const signal = searchSignalOf(gpsL1Ca);
parentPort?.on("message", ({ capture, prns, request }: SearchWork) =>
  parentPort?.postMessage(searchSatellites(capture, signal, prns, request)),
);
parentPort?.postMessage("loaded");
