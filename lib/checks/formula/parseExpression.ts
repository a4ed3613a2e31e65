import {
  ExpressionFault,
  FUNCTIONS,
  isConstantName,
  isFunctionName,
  MOST_NESTING,
  MOST_NODES,
  type Expression,
  type Operation,
} from "./expression";
import { tokensOf, type Token } from "./tokens";

/**
 * Reads a formula: sums of products of powers, a sign before a value, brackets, functions. `^` binds tightest and from the
 * right, so that -2^2 is -4 and 2^3^2 is 2^9.
 * @param names what may stand in it besides constants and functions
 * @throws ExpressionFault
 */
export function parseExpression(text: string, names: ReadonlySet<string>): Expression {
  const reader = new Reader(tokensOf(text), names);
  const tree = reader.sum();
  reader.end();
  return tree;
}

class Reader {
  #next = 0;
  #nodes = 0;
  #depth = 0;

  constructor(
    private readonly tokens: readonly Token[],
    private readonly names: ReadonlySet<string>,
  ) {}

  sum(): Expression {
    return this.#chain(["+", "-"], () => this.#product());
  }

  end(): void {
    const { sort, text, at } = this.#token;
    if (sort === "end") return;
    if (text === ")") throw new ExpressionFault("This bracket closes none. Delete it.", at);
    if (text === ",")
      throw new ExpressionFault(
        "A comma stands only between the values of a function. Write a point in a number: 0.5.",
        at,
      );
    throw new ExpressionFault(`Write + - * / or ^ before ${text}.`, at);
  }

  #product(): Expression {
    return this.#chain(["*", "/"], () => this.#signed());
  }

  #chain(signs: readonly Operation[], part: () => Expression): Expression {
    let left = part();
    for (;;) {
      const sign = signs.find((one) => one === this.#token.text);
      if (!sign) return left;
      const { at } = this.#take();
      left = this.#node({ is: sign, left, right: part(), at });
    }
  }

  #signed(): Expression {
    const { text } = this.#token;
    if (text !== "-" && text !== "+") return this.#power();
    const { at } = this.#take();
    const of = this.#deeper(at, () => this.#signed());
    return text === "-" ? this.#node({ is: "minus", of, at }) : of;
  }

  #power(): Expression {
    const left = this.#value();
    if (this.#token.text !== "^") return left;
    const { at } = this.#take();
    return this.#node({ is: "^", left, right: this.#deeper(at, () => this.#signed()), at });
  }

  #value(): Expression {
    const { sort, text, at } = this.#take();
    if (sort === "number") return this.#node({ is: "number", value: numberOf(text, at), at });
    if (sort === "name") return this.#named(text, at);
    if (text === "(") {
      const inside = this.#deeper(at, () => this.sum());
      this.#close(at);
      return inside;
    }
    const what = sort === "end" ? "The formula ends too early" : `A value is missing before ${text}`;
    throw new ExpressionFault(`${what}. Write a number, a name or a bracket here.`, at);
  }

  #named(name: string, at: number): Expression {
    if (this.#token.text !== "(") {
      if (this.names.has(name) || isConstantName(name)) return this.#node({ is: "name", name, at });
      if (isFunctionName(name)) throw new ExpressionFault(`${name} takes its value in brackets: ${name}(...).`, at);
      throw new ExpressionFault(unknownName(name, this.names), at);
    }
    if (!isFunctionName(name)) {
      const product = this.names.has(name) || isConstantName(name);
      if (product) throw new ExpressionFault(`Write ${name} * (...) for a product.`, at);
      throw new ExpressionFault(
        `There is no function ${name.slice(0, 40)}. There are ${Object.keys(FUNCTIONS).join(", ")}.`,
        at,
      );
    }
    const opened = this.#take().at;
    const given = this.#deeper(at, () => this.#list());
    this.#close(opened);
    const [fewest, most] = FUNCTIONS[name];
    if (given.length < fewest || given.length > most) {
      const count = fewest === most ? `${fewest} ${fewest === 1 ? "value" : "values"}` : `${fewest} to ${most} values`;
      throw new ExpressionFault(`${name} takes ${count}, parted by commas.`, at);
    }
    return this.#node({ is: "call", name, given, at });
  }

  #list(): Expression[] {
    const list = [this.sum()];
    while (this.#token.text === ",") {
      this.#take();
      list.push(this.sum());
    }
    return list;
  }

  #close(opened: number): void {
    if (this.#token.text !== ")")
      throw new ExpressionFault("This bracket is not closed. Write ) where it ends.", opened);
    this.#take();
  }

  get #token(): Token {
    return this.tokens[this.#next];
  }

  #take(): Token {
    const token = this.#token;
    if (token.sort !== "end") this.#next++;
    return token;
  }

  #node(node: Expression): Expression {
    if (++this.#nodes > MOST_NODES) {
      throw new ExpressionFault(`A formula has at most ${MOST_NODES} parts. Make two quantities of it.`, node.at);
    }
    return node;
  }

  #deeper<T>(at: number, read: () => T): T {
    if (++this.#depth > MOST_NESTING) {
      throw new ExpressionFault(`Brackets and signs are nested at most ${MOST_NESTING} deep.`, at);
    }
    const found = read();
    this.#depth--;
    return found;
  }
}

function numberOf(text: string, at: number): number {
  const value = Number(text);
  if (!Number.isFinite(value)) throw new ExpressionFault("This number is too large.", at);
  return value;
}

function unknownName(name: string, names: ReadonlySet<string>): string {
  const known = [...names, "c", "pi"].join(", ");
  return `${name.slice(0, 40)} is neither a given nor an earlier quantity of this check. Names are ${known}.`;
}
