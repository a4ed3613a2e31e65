import { FormatError } from "./FormatError";
import { linePosition, plainJson, readJson, type JsonNode } from "./readJson";
import { sampleFormatNamed, type SampleFormat } from "./sampleFormat";
import type { SigmfAnnotation, SigmfCapture, SigmfMeta } from "./sigmfMeta";

export const MOST_META_CHARACTERS = 4_000_000;
const MOST_ENTRIES = 20_000;

/**
 * Reads a `.sigmf-meta` text and holds it against the specification's schema.
 * @throws FormatError naming line, column and the rule
 */
export function readSigmfMeta(text: string): SigmfMeta {
  if (text.length > MOST_META_CHARACTERS)
    throw new FormatError(
      { line: 1, column: 1 },
      `the metadata have ${text.length} characters; ${MOST_META_CHARACTERS} are read.`,
    );
  const fields = fieldsOf(text);
  const top = fields(readJson(text), "the metadata");
  const global = fields(top.required("global"), "global");
  return {
    format: formatOf(text, global.required("core:datatype")),
    version:
      global.text("core:version", /^\d+\.\d+\.\d+$/, "a version such as 1.2.5") ?? global.missing("core:version"),
    sampleRateHz: global.number("core:sample_rate", 1, 1e12),
    channels: global.whole("core:num_channels", 1) ?? 1,
    sha512: global.text("core:sha512", /^[0-9a-fA-F]{128}$/, "128 hexadecimal digits")?.toLowerCase() ?? null,
    dataset: global.text("core:dataset", /^[^/\\]+$/, "the name of a file beside this one"),
    trailingBytes: global.whole("core:trailing_bytes", 0) ?? 0,
    more: global.rest(),
    captures: inOrder(text, list(text, top.required("captures"), "captures"), (node) =>
      captureOf(fields(node, "a capture")),
    ),
    annotations: list(text, top.required("annotations"), "annotations").map((node) =>
      annotationOf(fields(node, "an annotation")),
    ),
  };
}

function formatOf(text: string, node: JsonNode): SampleFormat {
  const format = node.kind === "string" ? sampleFormatNamed(node.value) : null;
  if (!format)
    throw new FormatError(
      linePosition(text, node.at),
      "core:datatype is c or r, then f32, f64, i32, i16, u32, u16, i8 or u8, then _le or _be beyond one byte: ci16_le.",
    );
  return format;
}

function captureOf(capture: Fields): SigmfCapture {
  return {
    sampleStart: capture.whole("core:sample_start", 0) ?? capture.missing("core:sample_start"),
    frequencyHz: capture.number("core:frequency", -1e12, 1e12),
    datetime: capture.text(
      "core:datetime",
      /^\d{4,}-\d\d-\d\dT\d\d:\d\d:\d\d(\.\d+)?(Z|[-+]\d\d:\d\d)$/,
      "an ISO 8601 time",
    ),
    headerBytes: capture.whole("core:header_bytes", 0) ?? 0,
    more: capture.rest(),
  };
}

function annotationOf(annotation: Fields): SigmfAnnotation {
  return {
    sampleStart: annotation.whole("core:sample_start", 0) ?? annotation.missing("core:sample_start"),
    sampleCount: annotation.whole("core:sample_count", 0),
    lowerEdgeHz: annotation.number("core:freq_lower_edge", -1e12, 1e12),
    upperEdgeHz: annotation.number("core:freq_upper_edge", -1e12, 1e12),
    label: annotation.text("core:label", /^/, "a text"),
    more: annotation.rest(),
  };
}

function list(text: string, node: JsonNode, name: string): JsonNode[] {
  if (node.kind !== "array") throw new FormatError(linePosition(text, node.at), `${name} is a list.`);
  if (node.items.length > MOST_ENTRIES)
    throw new FormatError(
      linePosition(text, node.at),
      `${name} has ${node.items.length} entries; ${MOST_ENTRIES} are read.`,
    );
  return node.items;
}

function inOrder(text: string, nodes: JsonNode[], read: (node: JsonNode) => SigmfCapture): SigmfCapture[] {
  const captures = nodes.map(read);
  captures.forEach(({ sampleStart }, n) => {
    if (n > 0 && sampleStart < captures[n - 1].sampleStart)
      throw new FormatError(
        linePosition(text, nodes[n].at),
        `this capture begins at sample ${sampleStart}, before the one ahead of it; they stand in ascending order.`,
      );
  });
  return captures;
}

type Fields = ReturnType<ReturnType<typeof fieldsOf>>;

/** Reads the members of an object one by one and remembers which have been read. */
function fieldsOf(text: string) {
  const fail = (node: JsonNode, sentence: string): never => {
    throw new FormatError(linePosition(text, node.at), sentence);
  };
  return (node: JsonNode, name: string) => {
    const members = node.kind === "object" ? node.members : fail(node, `${name} is an object in braces.`);
    const seen = new Set<string>();
    const member = (key: string) => {
      seen.add(key);
      return members.get(key);
    };
    const missing = (key: string): never => fail(node, `${name} has no ${key}, which must be there.`);
    const number = (key: string, lowest: number, highest: number): number | null => {
      const found = member(key);
      if (!found) return null;
      if (found.kind !== "number" || found.value < lowest || found.value > highest)
        return fail(found, `${key} is a number from ${lowest} to ${highest}.`);
      return found.value;
    };
    const whole = (key: string, lowest: number): number | null => {
      const value = number(key, lowest, Number.MAX_SAFE_INTEGER);
      if (value !== null && !Number.isInteger(value)) fail(members.get(key)!, `${key} is a whole number.`);
      return value;
    };
    const words = (key: string, pattern: RegExp, what: string): string | null => {
      const found = member(key);
      if (!found) return null;
      if (found.kind !== "string" || !pattern.test(found.value)) return fail(found, `${key} is ${what}.`);
      return found.value;
    };
    const required = (key: string): JsonNode => member(key) ?? missing(key);
    const rest = () =>
      Object.fromEntries([...members].filter(([key]) => !seen.has(key)).map(([key, left]) => [key, plainJson(left)]));
    return { required, missing, number, whole, text: words, rest };
  };
}
