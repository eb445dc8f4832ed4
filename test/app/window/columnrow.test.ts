import { fireEvent, render, screen } from '@testing-library/svelte';
import { beforeEach, expect, it } from 'vitest';
import type { BenchView, ColumnView, SourceView } from '../../../app/contract/messages';
import ColumnRow from '../../../app/window/parts/ColumnRow.svelte';
import SourceCard from '../../../app/window/parts/SourceCard.svelte';
import { BenchState } from '../../../app/window/state/bench.svelte';
import { DoubleEngine, viewOf } from './doubles';

let engine: DoubleEngine;
let bench: BenchState;
type Meaning = NonNullable<ColumnView['meaning']>;
const columnOf = (name: string, meaning?: Meaning): ColumnView => ({
  name,
  type: 'number',
  unit: undefined,
  present: 9,
  missing: 1,
  examples: ['1.5'],
  meaning,
  guess: { role: meaning?.role ?? 'ignore', unit: meaning?.unit, confidence: 0.9, reason: 'by its name' },
});
const sourceOf = (...columns: ColumnView[]): SourceView => ({
  source: {
    id: 'wide',
    path: 'wide.csv',
    sha256: 'a'.repeat(64),
    title: 'Wide',
    citation: '',
    invented: true,
    missing: [],
    columns: columns.flatMap(({ meaning }) => (meaning ? [meaning] : [])),
  },
  count: undefined,
  state: 'read',
  columns,
  problems: [],
});
const benchWith = (source: SourceView): BenchView => {
  const bare = viewOf(1, { sources: [source] });
  return { ...bare, recipe: { ...bare.recipe, sources: [source.source] } };
};
const columnsSent = (): unknown =>
  (engine.next('bench.change').params['change'] as { set: { columns: unknown } }).set.columns;

beforeEach(() => {
  engine = new DoubleEngine();
  bench = new BenchState(engine.link);
});

it('gives a column a role with the common unit of that role', async () => {
  const column = columnOf('D');
  const source = sourceOf(column);
  await engine.connect(benchWith(source));
  render(ColumnRow, { bench, source, column });
  await fireEvent.change(screen.getByLabelText('Role of D'), { target: { value: 'distance' } });
  expect(columnsSent()).toEqual([{ column: 'D', role: 'distance', unit: 'kpc' }]);
});

it('does not undo the role that another column got meanwhile', async () => {
  const [d, e] = [columnOf('D'), columnOf('E')];
  const source = sourceOf(d, e);
  await engine.connect(benchWith(source));
  render(ColumnRow, { bench, source, column: d });
  render(ColumnRow, { bench, source, column: e });
  await fireEvent.change(screen.getByLabelText('Role of D'), { target: { value: 'distance' } });
  await fireEvent.change(screen.getByLabelText('Role of E'), { target: { value: 'distance_error' } });
  const first = engine.next('bench.change');
  await engine.show(benchWith(sourceOf(columnOf('D', { column: 'D', role: 'distance', unit: 'kpc' }), e)));
  await first.answer(viewOf(1));
  expect(columnsSent()).toMatchObject([{ column: 'D' }, { column: 'E', role: 'distance_error' }]);
});

it('takes a column out of use', async () => {
  const column = columnOf('D', { column: 'D', role: 'distance', unit: 'pc' });
  const source = sourceOf(column);
  await engine.connect(benchWith(source));
  render(ColumnRow, { bench, source, column });
  expect(screen.getByLabelText<HTMLSelectElement>('Unit of D').value).toBe('pc');
  await fireEvent.change(screen.getByLabelText('Role of D'), { target: { value: 'ignore' } });
  expect(columnsSent()).toEqual([]);
});

it('finds columns by a part of their name where there are many', async () => {
  const source = sourceOf(...Array.from({ length: 30 }, (_, at) => columnOf(`Größe ${at}`)));
  await engine.connect(benchWith(source));
  render(SourceCard, { bench, source });
  const details = screen.getByText(/^Columns and roles/).closest('details')!;
  expect(screen.queryAllByLabelText(/^Role of/)).toEqual([]);
  details.open = true;
  await fireEvent(details, new Event('toggle'));
  await fireEvent.input(screen.getByLabelText('Find columns'), { target: { value: 'GRÖßE 2' } });
  expect(screen.getAllByLabelText(/^Role of/)).toHaveLength(11);
  await fireEvent.input(screen.getByLabelText('Find columns'), { target: { value: 'nothing' } });
  expect(screen.getByText(/No column has this/)).toBeTruthy();
});

it('says what to do when no row became an object', async () => {
  const count = { source: 'wide', rowsRead: 3000, objectRows: 0, duplicates: 0, quarantine: 3000 };
  const source = { ...sourceOf(columnOf('x')), count: count as SourceView['count'] };
  await engine.connect(benchWith(source));
  render(SourceCard, { bench, source });
  expect(screen.getByText(/No row became an object/)).toBeTruthy();
});
