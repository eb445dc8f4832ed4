import { VERDICTS } from '../../core/cuts/result';
import type { RosterAsk, RosterPage } from '../contract/messages';
import type { Session } from './session';

/** A page of the roster: sorted, searched and filtered. Objects without a value come last in either direction. */
export function rosterRows(session: Session, ask: RosterAsk): RosterPage {
  const { roster, quantities } = session.prepared;
  const { verdicts } = session.result;
  const wanted = new Set(ask.verdicts.map((verdict) => VERDICTS.findIndex((known) => known === verdict)));
  const search = ask.search.trim().toLowerCase();
  const chosen = sortedOrder(session, ask).filter(
    (row) =>
      (wanted.size === 0 || wanted.has(verdicts[row]!)) &&
      (search === '' || roster.names[row]!.toLowerCase().includes(search)),
  );
  const objects = chosen.slice(ask.offset, ask.offset + ask.count);
  const list = Array.from(objects);
  return {
    total: chosen.length,
    objects,
    names: list.map((row) => roster.names[row]!),
    keys: list.map((row) => roster.keys[row]!),
    verdicts: Uint8Array.from(list, (row) => verdicts[row]!),
    values: Object.fromEntries(
      ask.columns.map((id) => {
        const column = quantities.column(id)?.values;
        return [id, Float64Array.from(list, (row) => column?.[row] ?? Number.NaN)];
      }),
    ),
  };
}

/** Order of one session by a key, kept because a window asks for one page after another. */
const kept = new WeakMap<Session, { key: string; order: Int32Array }>();

function sortedOrder(session: Session, { sort, descending }: RosterAsk): Int32Array {
  const key = `${sort} ${descending}`;
  const known = kept.get(session);
  if (known?.key === key) return known.order;
  const { roster, quantities } = session.prepared;
  const order = Int32Array.from(roster.names, (_, row) => row);
  const turn = descending ? -1 : 1;
  if (sort === 'name') {
    const collator = new Intl.Collator('en', { numeric: true });
    order.sort((a, b) => turn * collator.compare(roster.names[a]!, roster.names[b]!));
  } else {
    const values = sort === 'verdict' ? Float64Array.from(session.result.verdicts) : quantities.column(sort)?.values;
    if (values) order.sort((a, b) => compare(values[a]!, values[b]!, turn));
  }
  kept.set(session, { key, order });
  return order;
}

function compare(a: number, b: number, turn: number): number {
  if (Number.isNaN(a) || Number.isNaN(b)) return Number(Number.isNaN(a)) - Number(Number.isNaN(b));
  return turn * (a - b);
}
