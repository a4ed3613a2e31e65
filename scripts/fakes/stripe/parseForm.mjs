/** `line_items[0][price_data][currency]=eur` and its kin as nested objects; lists are objects with number keys. */
export function parseForm(text) {
  const form = Object.create(null);
  for (const [name, value] of new URLSearchParams(text)) {
    const keys = name.replaceAll("]", "").split("[");
    const last = keys.pop();
    let place = form;
    for (const key of keys) place = place[key] ??= Object.create(null);
    place[last] = value;
  }
  return form;
}
