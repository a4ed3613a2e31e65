/** What we use of the package, which ships no types. Complex data alternate real and imaginary part. */
declare module "fft.js" {
  export default class FFT {
    constructor(size: number);
    readonly size: number;
    /** Twiddle factors exp(-2 pi i n / size), n from 0 to size - 1. */
    table: ArrayLike<number>;
    createComplexArray(): number[];
    transform(out: Float64Array | number[], data: ArrayLike<number>): void;
    inverseTransform(out: Float64Array | number[], data: ArrayLike<number>): void;
  }
}
