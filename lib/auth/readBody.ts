import "server-only";
import type { z } from "zod";
import { InvalidError } from "@/lib/errors";
import { parsed } from "./action";

const LONGEST = 256 * 1024;

/**
 * The JSON of a request, held against its schema.
 * @param options as for `parsed`
 * @throws InvalidError when it is none, too long, not as the schema says, or cannot be stored
 */
export async function readBody<S extends z.ZodType>(
  request: Request,
  schema: S,
  options?: { stored: boolean },
): Promise<z.output<S>> {
  const text = await request.text();
  if (text.length > LONGEST) throw new InvalidError("That is more than can be stored here.");
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    throw new InvalidError("The request is not JSON.");
  }
  return parsed(schema, value, options);
}
