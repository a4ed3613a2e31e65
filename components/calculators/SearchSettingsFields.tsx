"use client";
import { NumberField } from "@/components/ui/NumberField";

export type SettingsText = { coherentMs: string; sums: string; stepHz: string; halfWidthHz: string };

const FIELDS = [
  { key: "coherentMs", label: "Coherent", unit: "ms" },
  { key: "sums", label: "Sums", unit: "1" },
  { key: "stepHz", label: "Doppler step", unit: "Hz" },
  { key: "halfWidthHz", label: "Window ±", unit: "Hz" },
] as const;

/** How a capture is searched, as typed. */
export function SearchSettingsFields({
  value,
  onChange,
}: {
  value: SettingsText;
  onChange: (value: SettingsText) => void;
}) {
  return FIELDS.map(({ key, label, unit }) => (
    <NumberField
      key={key}
      label={label}
      unit={unit === "1" ? undefined : unit}
      value={value[key]}
      onChange={(text) => onChange({ ...value, [key]: text })}
      className="tablet:w-[8.25rem]"
    />
  ));
}
