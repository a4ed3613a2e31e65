/** What a check of the lead's own is called: after what it asks first, "Cable delay and 2 more". */
export function ownTitle(quantities: readonly { label: string }[]): string {
  const [first, ...rest] = quantities;
  if (!first) return "";
  const title = first.label.charAt(0).toUpperCase() + first.label.slice(1);
  return rest.length === 0 ? title : `${title} and ${rest.length} more`;
}
