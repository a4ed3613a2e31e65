import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { chacha20Blocks } from "@/lib/numeric/chacha20";
import { erfc } from "@/lib/numeric/erfc";
import { seededRandom } from "@/lib/numeric/random";
import { LAYER_AREA, LAYER_EDGES } from "@/lib/numeric/ziggurat";
import { expectNear } from "@/tests/support/expectNear";

const SEED = "000102030405060708090a0b0c0d0e0f101112131415161718191a1b1c1d1e1f";
const littleEndianWords = (hex: string) => new Uint32Array(Uint8Array.from(Buffer.from(hex, "hex")).buffer);

describe("chacha20Blocks", () => {
  // RFC 8439, section 2.3.2: key 00 to 1f, block counter 1.
  const key = littleEndianWords(SEED);
  const nonce = littleEndianWords("000000090000004a00000000");
  const PRINTED =
    "e4e7f110 15593bd1 1fdd0f50 c47120a3 c7f4d1c7 0368c033 9aaa2204 4e6cd4c3 " +
    "466482d2 09aa9f07 05d7c214 a2028bd9 d19c12b5 b94e16de e883d0cb 4e3c50a2";

  test("gives the block printed in RFC 8439, 2.3.2", () => {
    const block = new Uint32Array(16);
    chacha20Blocks(key, 1, nonce, block);
    expect([...block].map((word) => word.toString(16).padStart(8, "0")).join(" ")).toBe(PRINTED);
  });

  test("counts the blocks on", () => {
    const two = new Uint32Array(32);
    chacha20Blocks(key, 0, nonce, two);
    const second = new Uint32Array(16);
    chacha20Blocks(key, 1, nonce, second);
    expect(two.slice(16)).toEqual(second);
  });
});

describe("seededRandom", () => {
  test("repeats itself for the same seed and stream, and only then", () => {
    const ten = (seed: string, stream: string) => {
      const random = seededRandom(seed, stream);
      return Array.from({ length: 10 }, () => random.uniform());
    };
    expect(ten(SEED, "noise")).toEqual(ten(SEED, "noise"));
    const lists = [
      ten(SEED, "noise"),
      ten(SEED, "noise2"),
      ten(SEED, "scene"),
      ten(SEED, ""),
      ten("f".repeat(64), "noise"),
    ];
    expect(new Set(lists.map(String)).size).toBe(lists.length);
  });

  test("a draw in one stream moves nothing in another", () => {
    const [alone, beside, other] = [seededRandom(SEED, "a"), seededRandom(SEED, "a"), seededRandom(SEED, "b")];
    for (let n = 0; n < 50; n++) {
      other.gaussian();
      expect(beside.uniform()).toBe(alone.uniform());
    }
  });

  test.each(["", "00", "g".repeat(64), "0".repeat(63), "0".repeat(65)])("refuses the seed %j", (seed) =>
    expect(() => seededRandom(seed, "noise")).toThrow(RangeError),
  );

  test("uniform stays in [0, 1), is flat and uses the low bits", () => {
    const random = seededRandom(SEED, "uniform");
    const bins = new Array<number>(16).fill(0);
    let [odd, outside] = [0, 0];
    const draws = 64_000;
    for (let n = 0; n < draws; n++) {
      const u = random.uniform();
      outside += u >= 0 && u < 1 ? 0 : 1;
      bins[Math.floor(u * 16)] += 1;
      odd += (u * 2 ** 53) % 2;
    }
    expect(outside).toBe(0);
    const expected = draws / 16;
    const chiSquare = bins.reduce((sum, count) => sum + (count - expected) ** 2 / expected, 0);
    expect(chiSquare).toBeLessThan(37.697); // 15 degrees, exceeded once in a thousand: Abramowitz & Stegun, Table 26.8
    expectNear(odd / draws, 0.5, 4 * Math.sqrt(0.25 / draws), "share of odd last bits");
  });

  test("integer reaches both ends, evenly, for any span", () => {
    const random = seededRandom(SEED, "integer");
    const counts = new Map<number, number>();
    for (let n = 0; n < 30_000; n++) {
      const value = random.integer(-1, 1);
      counts.set(value, (counts.get(value) ?? 0) + 1);
    }
    expect([...counts.keys()].sort((a, b) => a - b)).toEqual([-1, 0, 1]);
    for (const count of counts.values())
      expectNear(count, 10_000, 5 * Math.sqrt(30_000 * (2 / 9)), "draws of one value");
    fc.assert(
      fc.property(fc.integer(), fc.nat({ max: 0xffffffff }), (from, span) => {
        const value = random.integer(from, from + span);
        return Number.isInteger(value) && value >= from && value <= from + span;
      }),
      { seed: 1 },
    );
    for (const [from, to] of [
      [1, 0],
      [0.5, 2],
      [0, 2 ** 32],
      [0, NaN],
    ])
      expect(() => random.integer(from, to)).toThrow(RangeError);
  });

  test("shuffle keeps every entry, leaves the list alone and reaches every order", () => {
    const random = seededRandom(SEED, "shuffle");
    const list = [1, 2, 3];
    const orders = new Map<string, number>();
    for (let n = 0; n < 6000; n++) {
      const order = String(random.shuffle(list));
      orders.set(order, (orders.get(order) ?? 0) + 1);
    }
    expect(list).toEqual([1, 2, 3]);
    expect(orders.size).toBe(6);
    for (const count of orders.values()) expectNear(count, 1000, 5 * Math.sqrt(1000 * (5 / 6)), "draws of one order");
    expect([..."abcdefgh"]).toContain(random.pick([..."abcdefgh"]));
  });
});

describe("gaussian", () => {
  // Marsaglia & Tsang (2000), 256 layers: v = 0.00492867323399 (from memory), whose last two digits their rounding of the
  // edge r leaves open.
  test("the layers have the published area and close at the peak", () => {
    expectNear(LAYER_AREA, 0.00492867323399, 5e-14, "area of a layer");
    const last = LAYER_EDGES[255];
    expectNear(last * (1 - Math.exp(-0.5 * last * last)), LAYER_AREA, 1e-12, "area of the top layer");
  });

  test("moments and every part of the law, out to the tail", () => {
    const random = seededRandom(SEED, "gaussian");
    const draws = 400_000;
    const sums = [0, 0, 0, 0];
    const edges = [-4, -3.6541528853610088, -3, -2, -1, -0.25, 0, 0.5, 1, 2.5, 3.6541528853610088, 4];
    const below = edges.map(() => 0);
    for (let n = 0; n < draws; n++) {
      const x = random.gaussian();
      [x, x * x, x * x * x, x * x * x * x].forEach((power, m) => {
        sums[m] += power;
      });
      edges.forEach((edge, m) => {
        if (x < edge) below[m] += 1;
      });
    }
    // Standard errors of the moments of a normal law: 1, sqrt 2, sqrt 15, sqrt 96 over sqrt N; five of them allowed.
    [
      [0, 1],
      [1, Math.SQRT2],
      [0, Math.sqrt(15)],
      [3, Math.sqrt(96)],
    ].forEach(([moment, deviation], m) =>
      expectNear(sums[m] / draws, moment, (5 * deviation) / Math.sqrt(draws), `moment ${m + 1}`),
    );
    edges.forEach((edge, m) => {
      const share = erfc(-edge / Math.SQRT2) / 2;
      expectNear(below[m], share * draws, 5 * Math.sqrt(draws * share * (1 - share)), `draws below ${edge}`);
    });
  });

  test("neighbouring draws are uncorrelated, also in size", () => {
    const random = seededRandom(SEED, "pairs");
    let [product, squares, last] = [0, 0, random.gaussian()];
    const draws = 200_000;
    for (let n = 0; n < draws; n++) {
      const next = random.gaussian();
      product += last * next;
      squares += (last * last - 1) * (next * next - 1);
      last = next;
    }
    expectNear(product / draws, 0, 5 / Math.sqrt(draws), "correlation");
    expectNear(squares / draws, 0, 10 / Math.sqrt(draws), "correlation of the squares");
  });
});
