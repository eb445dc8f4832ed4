import type { Verdict } from '../../../core/cuts/result';

/** What the verdicts mean, for those who meet them first here. */
export const VERDICT_WORDS: Readonly<Record<Verdict | 'sample', string>> = {
  sample: 'What a freeze writes as the sample: everything kept, and what is borderline but passes at its best values.',
  kept: 'Passes every cut, also when its values are off by their errors, or is kept by name.',
  borderline: 'Its errors reach across a limit: with slightly different values the decision would be the other one.',
  dropped: 'Fails at least one cut, also within its errors, or is dropped by name. Choose it to see which cut.',
  unjudged: 'A value that a cut needs is missing, and the cut was told neither to keep nor to drop such objects.',
};

/** A count as people read it: with separators of thousands. */
export function count(number: number): string {
  return number.toLocaleString('en');
}

/** A count with its noun. */
export function counted(number: number, one: string, more = `${one}s`): string {
  return `${count(number)} ${number === 1 ? one : more}`;
}
