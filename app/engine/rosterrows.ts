import { VERDICTS } from '../../core/cuts/result';
import { cleanName } from '../../core/roster/cleanname';
import type { RosterAsk, RosterPage } from '../contract/messages';
import type { Session } from './session';

/** A page of the roster: sorted, searched and filtered. Objects without a value come last in either direction. */
export function rosterRows(session: Session, ask: RosterAsk): RosterPage {
  const { roster, quantities } = session.prepared;
  const { verdicts } = session.result;
  const wanted = new Set(ask.verdicts.map((verdict) => VERDICTS.findIndex((known) => known === verdict)));
  const search = ask.search.trim().toLowerCase();
  const key = cleanName(search);
  const chosen = sortedOrder(session, ask).filter(
    (row) =>
      (wanted.size === 0 || wanted.has(verdicts[row]!)) &&
      (search === '' ||
        roster.names[row]!.toLowerCase().includes(search) ||
        (key !== '' && roster.keys[row]!.includes(key))),
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

/** The last order of some objects, or of what a ledger says of them; a window asks for one page after another. */
const kept = new WeakMap<object, { key: string; order: Int32Array }>();

function sortedOrder(session: Session, { sort, descending }: RosterAsk): Int32Array {
  // A moved limit changes verdicts only: names and quantities keep their order.
  const of = sort === 'verdict' ? session.result : session.prepared;
  const key = `${sort} ${descending}`;
  const known = kept.get(of);
  if (known?.key === key) return known.order;
  const { roster, quantities } = session.prepared;
  const order = Int32Array.from(roster.keys, (_, row) => row);
  const turn = descending ? -1 : 1;
  if (sort === 'name') {
    const words = roster.keys.map(countable);
    order.sort((a, b) => (words[a]! < words[b]! ? -turn : words[a]! > words[b]! ? turn : a - b));
  } else {
    const values = sort === 'verdict' ? Float64Array.from(session.result.verdicts) : quantities.column(sort)?.values;
    if (values) order.sort((a, b) => compare(values[a]!, values[b]!, turn));
  }
  kept.set(of, { key, order });
  return order;
}

/** A key whose numbers stand in their order: every run of digits behind its length. A collator takes four times as long. */
function countable(key: string): string {
  return key.replace(/\d+/g, (digits) => String.fromCharCode(0x30 + digits.length) + digits);
}

function compare(a: number, b: number, turn: number): number {
  if (Number.isNaN(a) || Number.isNaN(b)) return Number(Number.isNaN(a)) - Number(Number.isNaN(b));
  return turn * (a - b);
}
