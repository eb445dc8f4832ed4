import { beforeAll, expect, test } from 'vitest';
import { VERDICTS } from '../../../core/cuts/result';
import { carriedOut, truthOf } from './carriedout';

type CarriedOut = Awaited<ReturnType<typeof carriedOut>>;
const clusters = truthOf('clusters');
let demo: CarriedOut;
beforeAll(async () => {
  demo = await carriedOut('demo');
});

/** Shares of the sample that is of the halo, and of the halo, as far as it could be judged, that is in the sample. */
function recovery(
  { roster, result }: CarriedOut,
  truth: ReturnType<typeof truthOf>,
): { purity: number; completeness: number } {
  const unjudged = VERDICTS.indexOf('unjudged');
  let [sample, halo, both] = [0, 0, 0];
  roster.keys.forEach((key, object) => {
    const isHalo = truth.get(key)!.population === 'halo';
    if (result.sample.has(object)) sample++;
    if (isHalo && result.verdicts[object] !== unjudged) halo++;
    if (isHalo && result.sample.has(object)) both++;
  });
  return { purity: both / sample, completeness: both / halo };
}

test('the roster holds every true cluster once, and no other', () => {
  expect(new Set(demo.roster.keys)).toEqual(new Set(clusters.keys()));
  expect(demo.roster.rows).toBe(clusters.size);
});

test('the awkward rows of the deep survey are counted: one duplicate, one ragged, one without position', () => {
  const deep = demo.roster.counts[1]!;
  expect([deep.source, deep.duplicates, deep.quarantine]).toEqual(['deep', 1, 2]);
  expect(demo.roster.quarantine.map(({ reason }) => reason.code).sort()).toEqual(['no-position', 'ragged-row']);
});

test('the planted disagreements are the conflicts, and there are no others', () => {
  // Six values of the deep survey were moved by far more than their errors.
  expect(demo.roster.conflicts).toHaveLength(6);
  expect(new Set(demo.roster.conflicts.map(({ object }) => object)).size).toBe(6);
  expect(new Set(demo.roster.conflicts.map(({ quantity }) => quantity))).toEqual(
    new Set(['distance_modulus', 'v_los', 'feh', 'pm_ra']),
  );
});

test('positions come back within their errors', () => {
  const columns = (['x', 'y', 'z'] as const).map((id) => demo.quantities.column(id)!);
  let [inside, known] = [0, 0];
  demo.roster.keys.forEach((key, object) => {
    const truth = clusters.get(key)!;
    for (const [at, axis] of (['x', 'y', 'z'] as const).entries()) {
      const sigma = columns[at]!.sigma![object]!;
      if (Number.isNaN(sigma)) continue;
      known++;
      if (Math.abs(columns[at]!.values[object]! - truth[axis]) < 3 * sigma) inside++;
    }
  });
  expect(known).toBeGreaterThan(500);
  // 99.7 % of Gaussian errors; one planted distance and linear propagation may take a few.
  expect(inside / known).toBeGreaterThan(0.98);
});

test('the four cuts leave a sample of clusters that is nearly all halo and keeps most of the halo', () => {
  const { purity, completeness } = recovery(demo, clusters);
  expect(purity).toBeGreaterThan(0.95);
  expect(completeness).toBeGreaterThan(0.7);
});

test('the giants’ ledger, made for cleanness, keeps hardly anything but halo', async () => {
  const { purity, completeness } = recovery(await carriedOut('giants'), truthOf('giants'));
  expect(purity).toBeGreaterThan(0.99);
  expect(completeness).toBeGreaterThan(0.3);
});
