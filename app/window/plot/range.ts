/** Fixed ranges of angles; other quantities are shown over what they hold. */
const WHOLE: Readonly<Record<string, readonly [number, number]>> = {
  gal_l: [0, 360],
  gal_b: [-90, 90],
  pole_l: [0, 360],
  pole_b: [-90, 90],
  ra: [0, 360],
  dec: [-90, 90],
};
/** Share of the values at either end that may lie outside the first view. */
const TAIL = 0.002;

/** Values beyond this many are sampled evenly: a first view needs no more. */
const ENOUGH = 100_000;

/** The range that a plate shows of a quantity to begin with. */
export function firstRange(id: string, values: Float64Array): readonly [number, number] {
  const whole = WHOLE[id];
  if (whole) return whole;
  const finite = someOf(values).filter(Number.isFinite).sort();
  if (finite.length === 0) return [0, 1];
  const last = finite.length - 1;
  const [low, high] = [finite[Math.floor(TAIL * last)]!, finite[Math.ceil((1 - TAIL) * last)]!];
  const margin = 0.05 * (high - low) || 1;
  return [low - margin, high + margin];
}

function someOf(values: Float64Array): Float64Array {
  const every = Math.ceil(values.length / ENOUGH);
  if (every <= 1) return values;
  return Float64Array.from({ length: Math.floor(values.length / every) }, (_, at) => values[at * every]!);
}
