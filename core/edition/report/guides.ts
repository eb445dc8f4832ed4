import type { Limit } from '../../cuts/contract';
import type { Cut } from '../../cuts/cut';
import { cutKind } from '../../cuts/kinds';
import type { Plate } from '../recipe';
import { across, type Field, placeX, placeY } from './canvas';

/** What the cuts draw on a plate: their limits as lines, their lassos as outlines, and whose they are. */
export interface Guides {
  readonly path: string;
  readonly cuts: readonly string[];
}

/** Points along one edge of a lasso, which is straight in the logarithm when it was drawn so. */
const STEPS = 12;

/** Limits and lassos of the enabled cuts whose quantities are those of the plate. */
export function guidesOf(plate: Plate, ledger: readonly Cut[], field: Field): Guides {
  const drawn = ledger
    .filter((cut) => cut.on)
    .map((cut) => ({ id: cut.id, path: limitLines(cut, plate, field) + outline(cut, plate, field) }))
    .filter(({ path }) => path !== '');
  return { path: drawn.map(({ path }) => path).join(''), cuts: drawn.map(({ id }) => id) };
}

function limitLines(cut: Cut, plate: Plate, field: Field): string {
  const lines = (limit: Limit): string => {
    const axis = limit.quantity === plate.x ? 'x' : limit.quantity === plate.y ? 'y' : undefined;
    if (axis === undefined) return '';
    const values = limit.absolute ? [-limit.value, limit.value] : [limit.value];
    return values.map((value) => across(field, axis, value)).join('');
  };
  return cutKind(cut.kind).limits(cut.parameters).map(lines).join('');
}

function outline(cut: Cut, plate: Plate, field: Field): string {
  if (cut.kind !== 'lasso') return '';
  const { x, y, xLog, yLog, polygon } = cut.parameters;
  const turned = x === plate.y && y === plate.x;
  if (!turned && !(x === plate.x && y === plate.y)) return '';
  const between = (log: boolean, a: number, b: number, share: number): number =>
    log ? a * (b / a) ** share : a + (b - a) * share;
  const points = polygon.flatMap(([ax, ay], at) => {
    const [bx, by] = polygon[(at + 1) % polygon.length]!;
    const steps = xLog || yLog ? STEPS : 1;
    return Array.from({ length: steps }, (_, step): readonly [number, number] => [
      between(xLog, ax, bx, step / steps),
      between(yLog, ay, by, step / steps),
    ]);
  });
  return `M${points
    .map(([px, py]) => (turned ? [py, px] : [px, py]))
    .map(([px, py]) => `${placeX(field, px!)} ${placeY(field, py!)}`)
    .join('L')}Z`;
}
