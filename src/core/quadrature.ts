/** Positive nodes and their weights of the 20-point Gauss-Legendre rule on [-1, 1], by Newton's method on P20. */
export const GAUSS_POINTS = 20;
export const GAUSS_NODES = new Float64Array(GAUSS_POINTS / 2);
export const GAUSS_WEIGHTS = new Float64Array(GAUSS_POINTS / 2);

for (let i = 0; i < GAUSS_POINTS / 2; i++) {
  let x = Math.cos((Math.PI * (i + 0.75)) / (GAUSS_POINTS + 0.5));
  let slope = 1;
  for (let round = 0; round < 6; round++) {
    let before = 1;
    let p = x;
    for (let k = 2; k <= GAUSS_POINTS; k++) {
      const next = ((2 * k - 1) * x * p - (k - 1) * before) / k;
      before = p;
      p = next;
    }
    slope = (GAUSS_POINTS * (x * p - before)) / (x * x - 1);
    x -= p / slope;
  }
  GAUSS_NODES[i] = x;
  GAUSS_WEIGHTS[i] = 2 / ((1 - x) * (1 + x) * slope * slope);
}
