import { type Dice, dice } from './dice';
import { drawTracer, type Population } from './galaxy';
import { clusterName } from './names';
import { type Seen, seen } from './observe';
import { deepChance, wideChance } from './selection';

const COUNTS: readonly (readonly [Population, number])[] = [
  ['halo', 98],
  ['disc', 36],
  ['bulge', 20],
  ['stream', 26],
];

/** A cluster of the invented Galaxy and which of the two invented surveys hold it. */
export interface Cluster extends Seen {
  readonly name: string;
  readonly wide: boolean;
  readonly deep: boolean;
}

/** The 180 clusters of the demo. */
export function clusters(seed: number): Cluster[] {
  const d = dice(seed);
  const tracers = COUNTS.flatMap(([population, count]) =>
    Array.from({ length: count }, () => seen(drawTracer(population, d))),
  );
  return shuffled(tracers, d).map((object, index) => ({
    ...object,
    name: clusterName(index),
    ...membership(object, d),
  }));
}

/** Nothing is in neither survey: what the deep one does not list, the wide one does. */
function membership(object: Seen, d: Dice): { wide: boolean; deep: boolean } {
  const wide = d.uniform() < wideChance(object);
  const deep = d.uniform() < deepChance(object);
  return { wide: wide || !deep, deep };
}

function shuffled<T>(list: readonly T[], d: Dice): T[] {
  const result = [...list];
  for (let last = result.length - 1; last > 0; last--) {
    const other = Math.floor(d.uniform() * (last + 1));
    [result[last], result[other]] = [result[other]!, result[last]!];
  }
  return result;
}
