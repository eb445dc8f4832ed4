import { Bitset } from '../table/bitset';
import type { Outcome } from './contract';
import { isInside, isNear, type Outline } from './outline';
import type { Points } from './points';

/** Judges whether points lie inside an outline; those whose errors reach the outline are borderline. */
export function judgeInside(outline: Outline, points: Points): Outcome {
  const { x, y } = points;
  const rows = x.length;
  const [surely, passes, possibly, unjudged] = [new Bitset(rows), new Bitset(rows), new Bitset(rows), new Bitset(rows)];
  for (let word = 0, row = 0; row < rows; word++) {
    const end = Math.min(rows, row + 32);
    let [inner, near, unknown] = [0, 0, 0];
    for (let bit = 0; row < end; row++, bit++) {
      if (x[row] !== x[row] || y[row] !== y[row]) unknown |= 1 << bit;
      else {
        if (isInside(outline, points, row)) inner |= 1 << bit;
        if (isNear(outline, points, row)) near |= 1 << bit;
      }
    }
    surely.words[word] = inner & ~near;
    passes.words[word] = inner;
    possibly.words[word] = inner | near;
    unjudged.words[word] = unknown;
  }
  return { surely, passes, possibly, unjudged };
}
