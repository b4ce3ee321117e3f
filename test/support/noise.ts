/** Standard normal numbers from a fixed seed: a linear congruential generator (Park and Miller) through Box and Muller. */
export function seededNormal(seed: number): () => number {
  let state = seed;
  const uniform = () => {
    state = (state * 16807) % 2147483647;
    return state / 2147483647;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}
