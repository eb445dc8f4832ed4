import type { Judged, Limit, Outcome } from './contract';
import { nothingJudged } from './combine';
import { judgeThreshold } from './threshold';

/** Judges the quantity of one limit; a quantity that the data cannot give leaves every object unjudged. */
export function judgeLimit(limit: Limit, objects: Judged, margin: number): Outcome {
  const column = objects.column(limit.quantity);
  if (column === undefined) return nothingJudged(objects.rows);
  return judgeThreshold(column, { limit: limit.value, keeps: limit.keeps, absolute: limit.absolute }, margin);
}

/** A limit in words: "|z| ≥ 4 kpc". */
export function limitText(limit: Limit): string {
  const name = limit.absolute ? `|${limit.label}|` : limit.label;
  return `${name} ${limit.keeps === 'below' ? '≤' : '≥'} ${plain(limit.value)}${limit.unit === '' ? '' : ` ${limit.unit}`}`;
}

/** A number in running text, with a true minus sign. */
export function plain(value: number): string {
  return String(value).replace('-', '−');
}

/** Builds a limit, or nothing when it is switched off. */
export function limitOf(
  parameter: string,
  value: number | null,
  about: Omit<Limit, 'parameter' | 'value' | 'absolute'> & { absolute?: boolean },
): Limit[] {
  return value === null ? [] : [{ absolute: false, ...about, parameter, value }];
}
