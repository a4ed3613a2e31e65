/** a minus b the short way round a circle of that length, from -length/2 to length/2. */
export function circularDifference(a: number, b: number, length: number): number {
  const turned = a - b;
  return turned - length * Math.floor(turned / length + 0.5);
}
