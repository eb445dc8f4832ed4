import type { Problem } from '../table/problem';

const SHOWN = 50;

/** The first problems of a list of one kind as they are, and one that stands for all the others. */
export function condensed(problems: readonly Problem[], what: 'rows' | 'objects'): readonly Problem[] {
  const rest = problems.slice(SHOWN);
  const first = rest[0];
  if (!first) return problems;
  const { code, severity, where, line } = first;
  const found = `each of ${rest.length} further ${what}`;
  return [...problems.slice(0, SHOWN), { code, severity, where, line, count: rest.length, found }];
}
