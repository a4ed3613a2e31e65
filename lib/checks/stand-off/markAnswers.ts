import { askedQuantities, type AskedQuantity } from "../askedQuantities";
import { finishMarking } from "../finishMarking";
import { formatQuantity } from "../formatQuantity";
import type { Answers, CheckPlan, MarkedRow, Marking } from "../kind";
import type { StandOffTruth } from "./drawCase";
import { markEffective, markReceived } from "./level-rows";
import { INTERFERENCE_TEXT, Q_OF } from "./interference-types";
import type { StandOffParameters } from "./parameters";
import { standOffQuantities } from "./quantities";
import { markRecovery, markUsable } from "./receiver-rows";
import { milliwattsToDbm } from "@/lib/gnss/interference/standOff";
import { decidingCn0DbHz, jsDb } from "./standOffOf";

type Marker = (truth: StandOffTruth, quantity: AskedQuantity, answers: Answers) => MarkedRow | MarkedRow[];

const MARKERS: Readonly<Record<string, Marker>> = {
  received: markReceived,
  effective: markEffective,
  usable: markUsable,
  recovery: markRecovery,
};

/** Sets a hand-in against the site; effective C/N0 and the count against the candidate's own earlier values. */
export function markAnswers(truth: StandOffTruth, plan: CheckPlan<StandOffParameters>, answers: Answers): Marking {
  const asked = askedQuantities(standOffQuantities, plan);
  const rows = [...asked.values()].flatMap((quantity) => MARKERS[quantity.id](truth, quantity, answers));
  return finishMarking({ id: "stand-off", version: 1 }, plan, asked, rows, workingsOf(truth));
}

function workingsOf({ site, type, receivedDbm, effectiveDbHz, recoveryM }: StandOffTruth): Marking["workings"] {
  const lossDb = site.antennaGainDb - receivedDbm + milliwattsToDbm(site.eirpMw);
  return [
    { label: "Interference", value: `${INTERFERENCE_TEXT[type]}: Q ${Q_OF[type]}` },
    { label: "EIRP", value: formatQuantity(milliwattsToDbm(site.eirpMw), "dBm", 1) },
    { label: "Path loss with what stands between", value: formatQuantity(lossDb, "dB", 1) },
    { label: "At the antenna's terminals", value: formatQuantity(receivedDbm, "dBm", 1) },
    ...site.satellites.map(({ prn, cn0DbHz }, n) => ({
      label: `PRN ${prn}`,
      value: `J/S ${formatQuantity(jsDb(site, receivedDbm, cn0DbHz), "dB", 1)}, effective ${formatQuantity(effectiveDbHz[n], "dB-Hz", 1)}`,
    })),
    { label: "Deciding, the fourth strongest", value: formatQuantity(decidingCn0DbHz(site), "dB-Hz", 1) },
    { label: "Distance of recovery", value: formatQuantity(recoveryM, "m", recoveryM < 100 ? 1 : 0) },
  ];
}
