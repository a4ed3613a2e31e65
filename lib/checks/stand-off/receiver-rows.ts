import { answerOf } from "../answerOf";
import type { AskedQuantity } from "../askedQuantities";
import { formatQuantity } from "../formatQuantity";
import { formatUnderstood } from "../formatUnderstood";
import type { Answers, MarkedRow } from "../kind";
import { markNumber, type Finding } from "../markNumber";
import { parseQuantity } from "../parseQuantity";
import { otherType, type StandOffTruth } from "./drawCase";
import { Q_OF } from "./interference-types";
import { usableOf } from "./solve";
import { decidingCn0DbHz, NEEDED, recoveryM } from "./standOffOf";
import { voltageRecoveryM } from "./voltageRatio";

/** A count of the candidate's own values where they can be read. */
export function markUsable(truth: StandOffTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const { site } = truth;
  const own = site.satellites.map(({ prn }, n) => {
    const reading = parseQuantity(answerOf(answers, `effective.prn${prn}`), "dB-Hz");
    return "value" in reading ? reading.value : truth.effectiveDbHz[n];
  });
  const computed = usableOf(site, own);
  return markNumber({
    quantity,
    typed: answerOf(answers, "receiver.usable"),
    computed,
    unit: "1",
    decimals: 0,
    tolerance: 0,
    toleranceText: "same",
    explain: () => ({
      errorClass: null,
      reason: `By your own values ${computed} of ${own.length} reach ${formatUnderstood(site.thresholdDbHz, "dB-Hz")}.`,
    }),
  });
}

/** Judged on its own, whatever was handed in before it. */
export function markRecovery(truth: StandOffTruth, quantity: AskedQuantity, answers: Answers): MarkedRow {
  const share = quantity.tolerance / 100;
  return markNumber({
    quantity,
    typed: answerOf(answers, "receiver.recovery"),
    computed: truth.recoveryM,
    unit: "m",
    decimals: truth.recoveryM < 100 ? 1 : 0,
    tolerance: share * truth.recoveryM,
    toleranceText: `±${formatUnderstood(quantity.tolerance, "%")}`,
    explain: (value) => explainRecovery(truth, value, share),
  });
}

/** The known mistake whose distance is nearest, where one is within the tolerance. */
function explainRecovery(truth: StandOffTruth, value: number, share: number): Finding {
  const { site, type } = truth;
  const off = (other: number) => Math.abs(value - other) / other;
  const known = knownMistakes(truth).sort((a, b) => off(a.distanceM) - off(b.distanceM));
  if (off(known[0].distanceM) <= share) return { errorClass: known[0].errorClass, reason: known[0].reason };
  const deciding = formatQuantity(decidingCn0DbHz(site), "dB-Hz", 1);
  return {
    errorClass: null,
    reason: `The fourth strongest satellite, ${deciding}, decides, with Q ${Q_OF[type]} and the path given.`,
  };
}

function knownMistakes({ site, type }: StandOffTruth): (Finding & { distanceM: number })[] {
  const q = Q_OF[type];
  const otherQ = Q_OF[otherType(type)];
  const deciding = decidingCn0DbHz(site);
  const strengths = site.satellites.map(({ cn0DbHz }) => cn0DbHz);
  return [
    {
      distanceM: recoveryM({ ...site, antennaGainDb: 0 }, q, deciding),
      errorClass: "antenna gain forgotten",
      reason: `This is the distance without the antenna's ${formatUnderstood(site.antennaGainDb, "dB")} towards the interferer.`,
    },
    {
      distanceM: recoveryM(site, otherQ, deciding),
      errorClass: "wrong Q",
      reason: `This is the distance for a Q of ${otherQ}; here it is ${q}.`,
    },
    {
      distanceM: recoveryM(site, q, Math.max(...strengths)),
      errorClass: "strongest satellite",
      reason: `Here the strongest satellite recovers; ${NEEDED} are needed.`,
    },
    {
      distanceM: recoveryM(site, q, Math.min(...strengths)),
      errorClass: "weakest satellite",
      reason: `Here all satellites recover; ${NEEDED} are enough.`,
    },
    {
      distanceM: voltageRecoveryM(site, q),
      errorClass: "J/S in volts",
      reason: "J and S are powers, so their ratio in dB is 10 log.",
    },
  ];
}
