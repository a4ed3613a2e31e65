/** One plain line for the person at the terminal. */
export const say = (line) => process.stdout.write(`${line}\n`);

/** A stop that is nobody's bug: the message tells what to do, a stack would only hide it. */
export class Refusal extends Error {
  name = "Refusal";
}
