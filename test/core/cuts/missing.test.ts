import { describe, expect, it } from 'vitest';
import { judgeLedger } from '../../../core/cuts/ledger';
import type { MissingRule } from '../../../core/cuts/missing';
import { type Verdict, VERDICTS } from '../../../core/cuts/result';
import { cutOf, objectsWith } from './objects';

// |z| of 4.1 ± 0.2 is near the limit of 4, 9 ± 0.2 clearly beyond it, 1 ± 0.2 clearly within, 3.9 ± 0.2 near from below;
// the speed of all of them is unknown.
const objects = objectsWith({
  z: [
    [4.1, 0.2],
    [9, 0.2],
    [1, 0.2],
    [3.9, 0.2],
  ],
  toomre_speed: [Number.NaN, Number.NaN, Number.NaN, Number.NaN],
});

function verdicts(combine: 'any' | 'all', missing: MissingRule): Verdict[] {
  const disc = { combine, absZMin: 4, cylRMin: null, vPhiMax: null, toomreMin: 210 };
  const { verdicts: codes } = judgeLedger([cutOf('disc', disc, { missing })], objects, { margin: 1 });
  return Array.from(codes, (code) => VERDICTS[code]!);
}

describe('the rule for missing values holds for each test, not for the whole cut', () => {
  it('where every test has to be passed, a kept unknown leaves the known test its say', () => {
    expect(verdicts('any', 'keep')).toEqual(['borderline', 'kept', 'dropped', 'borderline']);
  });

  it('where every test has to be passed, a dropped unknown fails whatever the known test says', () => {
    expect(verdicts('any', 'drop')).toEqual(['dropped', 'dropped', 'dropped', 'dropped']);
  });

  it('where one passed test is enough, a kept unknown is that one', () => {
    expect(verdicts('all', 'keep')).toEqual(['kept', 'kept', 'kept', 'kept']);
  });

  it('where one passed test is enough, a dropped unknown leaves the known test its say', () => {
    expect(verdicts('all', 'drop')).toEqual(['borderline', 'kept', 'dropped', 'borderline']);
  });

  it('without a rule, an unknown leaves open what the known test does not decide', () => {
    expect(verdicts('any', 'unjudged')).toEqual(['unjudged', 'unjudged', 'dropped', 'borderline']);
    expect(verdicts('all', 'unjudged')).toEqual(['borderline', 'kept', 'unjudged', 'unjudged']);
  });

  it('a quantity that the data lack altogether follows the rule too', () => {
    const bare = objectsWith({ feh: [-2, -1.1] });
    const ledger = [cutOf('extinction', { ebvMax: 0.3, avMax: null, absBMin: null }, { missing: 'keep' })];
    expect(judgeLedger(ledger, bare, { margin: 1 }).counts).toMatchObject({ kept: 2, unjudged: 0 });
  });
});
