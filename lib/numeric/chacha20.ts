/**
 * ChaCha20 keystream, RFC 8439 section 2.3: 256-bit key, 96-bit nonce, 32-bit block counter.
 * @param key eight words, little-endian as in the RFC
 * @param counter number of the first block, 0 to 2^32 - 1
 * @param nonce three words
 * @param out receives whole blocks of 16 words; its length is a multiple of 16
 */
export function chacha20Blocks(key: Uint32Array, counter: number, nonce: Uint32Array, out: Uint32Array): void {
  const state = new Int32Array([0x61707865, 0x3320646e, 0x79622d32, 0x6b206574, ...key, counter, ...nonce]); // "expand 32-byte k"
  for (let offset = 0; offset < out.length; offset += 16) {
    block(state, out, offset);
    state[12] = (state[12] + 1) | 0;
  }
}

/** One block. Sixteen local variables instead of an array: this is the innermost loop of every simulated capture. */
function block(s: Int32Array, out: Uint32Array, at: number): void {
  let [a0, a1, a2, a3] = [s[0], s[1], s[2], s[3]];
  let [b0, b1, b2, b3] = [s[4], s[5], s[6], s[7]];
  let [c0, c1, c2, c3] = [s[8], s[9], s[10], s[11]];
  let [d0, d1, d2, d3] = [s[12], s[13], s[14], s[15]];
  for (let round = 0; round < 10; round++) {
    // Column round, then diagonal round: quarter rounds of section 2.1.
    a0 = (a0 + b0) | 0;
    d0 ^= a0;
    d0 = (d0 << 16) | (d0 >>> 16);
    c0 = (c0 + d0) | 0;
    b0 ^= c0;
    b0 = (b0 << 12) | (b0 >>> 20);
    a0 = (a0 + b0) | 0;
    d0 ^= a0;
    d0 = (d0 << 8) | (d0 >>> 24);
    c0 = (c0 + d0) | 0;
    b0 ^= c0;
    b0 = (b0 << 7) | (b0 >>> 25);
    a1 = (a1 + b1) | 0;
    d1 ^= a1;
    d1 = (d1 << 16) | (d1 >>> 16);
    c1 = (c1 + d1) | 0;
    b1 ^= c1;
    b1 = (b1 << 12) | (b1 >>> 20);
    a1 = (a1 + b1) | 0;
    d1 ^= a1;
    d1 = (d1 << 8) | (d1 >>> 24);
    c1 = (c1 + d1) | 0;
    b1 ^= c1;
    b1 = (b1 << 7) | (b1 >>> 25);
    a2 = (a2 + b2) | 0;
    d2 ^= a2;
    d2 = (d2 << 16) | (d2 >>> 16);
    c2 = (c2 + d2) | 0;
    b2 ^= c2;
    b2 = (b2 << 12) | (b2 >>> 20);
    a2 = (a2 + b2) | 0;
    d2 ^= a2;
    d2 = (d2 << 8) | (d2 >>> 24);
    c2 = (c2 + d2) | 0;
    b2 ^= c2;
    b2 = (b2 << 7) | (b2 >>> 25);
    a3 = (a3 + b3) | 0;
    d3 ^= a3;
    d3 = (d3 << 16) | (d3 >>> 16);
    c3 = (c3 + d3) | 0;
    b3 ^= c3;
    b3 = (b3 << 12) | (b3 >>> 20);
    a3 = (a3 + b3) | 0;
    d3 ^= a3;
    d3 = (d3 << 8) | (d3 >>> 24);
    c3 = (c3 + d3) | 0;
    b3 ^= c3;
    b3 = (b3 << 7) | (b3 >>> 25);
    a0 = (a0 + b1) | 0;
    d3 ^= a0;
    d3 = (d3 << 16) | (d3 >>> 16);
    c2 = (c2 + d3) | 0;
    b1 ^= c2;
    b1 = (b1 << 12) | (b1 >>> 20);
    a0 = (a0 + b1) | 0;
    d3 ^= a0;
    d3 = (d3 << 8) | (d3 >>> 24);
    c2 = (c2 + d3) | 0;
    b1 ^= c2;
    b1 = (b1 << 7) | (b1 >>> 25);
    a1 = (a1 + b2) | 0;
    d0 ^= a1;
    d0 = (d0 << 16) | (d0 >>> 16);
    c3 = (c3 + d0) | 0;
    b2 ^= c3;
    b2 = (b2 << 12) | (b2 >>> 20);
    a1 = (a1 + b2) | 0;
    d0 ^= a1;
    d0 = (d0 << 8) | (d0 >>> 24);
    c3 = (c3 + d0) | 0;
    b2 ^= c3;
    b2 = (b2 << 7) | (b2 >>> 25);
    a2 = (a2 + b3) | 0;
    d1 ^= a2;
    d1 = (d1 << 16) | (d1 >>> 16);
    c0 = (c0 + d1) | 0;
    b3 ^= c0;
    b3 = (b3 << 12) | (b3 >>> 20);
    a2 = (a2 + b3) | 0;
    d1 ^= a2;
    d1 = (d1 << 8) | (d1 >>> 24);
    c0 = (c0 + d1) | 0;
    b3 ^= c0;
    b3 = (b3 << 7) | (b3 >>> 25);
    a3 = (a3 + b0) | 0;
    d2 ^= a3;
    d2 = (d2 << 16) | (d2 >>> 16);
    c1 = (c1 + d2) | 0;
    b0 ^= c1;
    b0 = (b0 << 12) | (b0 >>> 20);
    a3 = (a3 + b0) | 0;
    d2 ^= a3;
    d2 = (d2 << 8) | (d2 >>> 24);
    c1 = (c1 + d2) | 0;
    b0 ^= c1;
    b0 = (b0 << 7) | (b0 >>> 25);
  }
  out[at + 0] = a0 + s[0];
  out[at + 1] = a1 + s[1];
  out[at + 2] = a2 + s[2];
  out[at + 3] = a3 + s[3];
  out[at + 4] = b0 + s[4];
  out[at + 5] = b1 + s[5];
  out[at + 6] = b2 + s[6];
  out[at + 7] = b3 + s[7];
  out[at + 8] = c0 + s[8];
  out[at + 9] = c1 + s[9];
  out[at + 10] = c2 + s[10];
  out[at + 11] = c3 + s[11];
  out[at + 12] = d0 + s[12];
  out[at + 13] = d1 + s[13];
  out[at + 14] = d2 + s[14];
  out[at + 15] = d3 + s[15];
}
