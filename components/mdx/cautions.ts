export type CautionTopic = "height" | "lightning" | "mains" | "rf" | "transmit" | "life";

/** The product's standing cautions, in one place. The rules of the place and licensed practice come before all of them. */
export const CAUTIONS: Readonly<Record<CautionTopic, { title: string; text: string }>> = {
  height: {
    title: "Work at height.",
    text: "Climb only under your employer's plan for this site, trained, attached, with rescue arranged. Wind, ice and failing light end the work. Local rules and the rules of the site come before this text.",
  },
  lightning: {
    title: "Lightning.",
    text: "Keep the stop rule of the site: no one stays on a roof or mast while a storm is forecast, seen or heard. Bonds and surge arresters belong to the lightning protection of the building. Change nothing in it without its designer, and open no arrester when a storm may come.",
  },
  mains: {
    title: "Mains.",
    text: "A competent person isolates, locks off and proves dead before a cover is opened, under the wiring rules that apply here. Power fed up the antenna cable is a supply too.",
  },
  rf: {
    title: "Radio-frequency exposure.",
    text: "A receive antenna often stands beside transmit panels. Stay out of their exclusion zones and within the exposure limits of the site. Only those who run a transmitter switch it off or on.",
  },
  transmit: {
    title: "Receive only.",
    text: "Generated captures are for analysis. To radiate, re-radiate, jam or simulate satellite signals on the air is unlawful without a licence. Tests use a shielded, cabled set-up.",
  },
  life: {
    title: "Not for safety of life.",
    text: "Nothing here is approved for safety-of-life use. A certificate is the employer's statement of competence and not a licence. Local codes and licensed practice come first.",
  },
};

export const cautionText = (topic: CautionTopic): { title: string; text: string } => CAUTIONS[topic];
