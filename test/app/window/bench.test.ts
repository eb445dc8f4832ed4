import { describe, expect, it } from 'vitest';
import { RefusedError } from '../../../app/contract/link';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { latest } from '../../../app/window/state/latest';
import { Values } from '../../../app/window/state/values.svelte';
import { FakeLink, settle, viewOf } from './fakelink';

const limit = (value: number) => ({ type: 'set-cut', cut: 'metals', set: { parameters: { max: value } } }) as const;

async function joined(view = viewOf()): Promise<{ link: FakeLink; bench: BenchState }> {
  const link = new FakeLink();
  const bench = new BenchState(link);
  await link.connect(view);
  return { link, bench };
}

describe('views', () => {
  it('an older one that comes late is passed over, and the first after a connection is the truth', async () => {
    const { link, bench } = await joined(viewOf({ revision: 7 }));
    link.tell('bench', viewOf({ revision: 6 }));
    expect(bench.view!.revision).toBe(7);
    await link.lose();
    expect(bench.connected).toBe(false);
    await link.connect(viewOf({ revision: 2 }));
    expect(bench.view!.revision).toBe(2);
  });

  it('forget what was pointed at when the objects change', async () => {
    const { link, bench } = await joined();
    bench.chosen = 3;
    link.tell('bench', viewOf({ revision: 2 }));
    expect(bench.chosen).toBe(3);
    link.tell('bench', viewOf({ revision: 3, version: 2 }));
    expect(bench.chosen).toBe(-1);
  });
});

describe('gestures', () => {
  it('have one change under way, and the newest wins', async () => {
    const { link, bench } = await joined();
    for (const value of [-1, -1.1, -1.2]) bench.gesture(limit(value), 'drag');
    expect(link.count('bench.change')).toBe(1);
    link.last('bench.change').answer(viewOf());
    await settle();
    expect(link.count('bench.change')).toBe(2);
    expect(link.last('bench.change').params).toEqual({ change: limit(-1.2), gesture: 'drag' });
  });

  it('are sent again when the engine was lost before it took them', async () => {
    const { link, bench } = await joined();
    bench.gesture(limit(-1.3), 'drag');
    await link.lose();
    expect(link.count('bench.change')).toBe(1);
    await link.connect(viewOf());
    expect(link.count('bench.change')).toBe(2);
    expect(link.last('bench.change').params).toEqual({ change: limit(-1.3), gesture: 'drag' });
    expect(bench.refusals).toEqual([]);
  });

  it('are heard before any step that follows them', async () => {
    const { link, bench } = await joined();
    bench.gesture(limit(-1), 'typing');
    bench.gesture(limit(-2), 'typing');
    const saved = bench.step('bench.save', {});
    link.last('bench.change').answer(viewOf());
    await settle();
    expect(link.count('bench.save')).toBe(0);
    link.last('bench.change').answer(viewOf());
    await settle();
    expect(link.asked.map(({ name }) => name).slice(-2)).toEqual(['bench.change', 'bench.save']);
    link.last('bench.save').answer({ path: '/x' });
    expect(await saved).toEqual({ path: '/x' });
  });
});

describe('steps', () => {
  it('say what was refused, and that an engine was lost', async () => {
    const { link, bench } = await joined();
    const refused = bench.step('bench.undo', {});
    await settle();
    link
      .last('bench.undo')
      .refuse(new RefusedError([{ code: 'disk-full', severity: 'error', text: 'The disk is full.' }]));
    expect(await refused).toBeUndefined();
    const lost = bench.change({ type: 'remove-cut', cut: 'metals' });
    await settle();
    await link.lose();
    expect(await lost).toBe(false);
    expect(bench.refusals).toEqual(['The disk is full.', expect.stringMatching(/engine was lost/)]);
  });
});

describe('values', () => {
  it('are those of one engine and one set of objects', async () => {
    const { link, bench } = await joined();
    const values = new Values(bench);
    expect(values.column('r')).toBeUndefined();
    const early = link.last('quantity.values');
    link.tell('bench', viewOf({ revision: 2, version: 2 }));
    expect(values.column('r')).toBeUndefined();
    early.answer({ version: 1, values: { r: Float64Array.of(1) } });
    await settle();
    expect(values.column('r')).toBeUndefined();
    link.last('quantity.values').answer({ version: 2, values: { r: Float64Array.of(2) } });
    await settle();
    expect(values.column('r')).toEqual(Float64Array.of(2));
    await link.lose();
    await link.connect(viewOf({ revision: 1, version: 2 }));
    expect(values.column('r')).toBeUndefined();
  });

  it('are asked for again when the engine was lost', async () => {
    const { link, bench } = await joined();
    const values = new Values(bench);
    values.column('r');
    link.last('quantity.values').refuse(new RefusedError([]));
    await settle();
    values.column('r');
    expect(link.count('quantity.values')).toBe(2);
  });
});

it('latest asks once at a time and then once more for the newest', async () => {
  const open: ((answer: number | undefined) => void)[] = [];
  const [asked, taken]: number[][] = [[], []];
  const turn = latest(
    (wanted: number) => {
      asked!.push(wanted);
      return new Promise<number | undefined>((resolve) => open.push(resolve));
    },
    (answer) => taken!.push(answer),
  );
  [1, 2, 3].forEach(turn);
  expect(asked).toEqual([1]);
  open[0]!(10);
  await settle();
  expect(asked).toEqual([1, 3]);
  open[1]!(undefined);
  await settle();
  expect(taken).toEqual([10]);
});
