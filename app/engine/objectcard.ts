import type { Cut } from '../../core/cuts/cut';
import { VERDICTS } from '../../core/cuts/result';
import { wayMark } from '../../core/cuts/way';
import type { MeasuredId } from '../../core/table/role';
import type { ObjectCard } from '../contract/messages';
import type { Session } from './session';
import { conflictText } from './views';

/** Everything about one object: values with their origin, its way through the ledger, conflicts, a decision by name. */
export function objectCard(session: Session, object: number): ObjectCard {
  const { recipe, prepared, result } = session;
  const { roster, quantities } = prepared;
  const key = roster.keys[object]!;
  const decided = recipe.ledger
    .filter((cut): cut is Extract<Cut, { kind: 'named' }> => cut.kind === 'named')
    .flatMap((cut) => cut.parameters.objects)
    .find((entry) => entry.key === key);
  return {
    object,
    name: roster.names[object]!,
    key,
    verdict: VERDICTS[result.verdicts[object]!]!,
    values: quantities.definitions.flatMap(({ id, origin }) => {
      const column = quantities.column(id);
      const value = column?.values[object] ?? Number.NaN;
      if (Number.isNaN(value)) return [];
      return [
        { id, value, sigma: column?.sigma?.[object] ?? Number.NaN, from: originText(session, id, object, origin) },
      ];
    }),
    way: recipe.ledger.map((cut, at) => ({
      cut: cut.id,
      describe: result.attrition[at]!.describe,
      on: cut.on,
      outcome: wayMark(result.outcomes[at]!, object),
    })),
    conflicts: roster.conflicts
      .filter((conflict) => conflict.object === object)
      .map((conflict) => conflictText(conflict, roster.names)),
    named: decided && { action: decided.action, reason: decided.reason },
  };
}

function originText({ prepared }: Session, id: string, object: number, origin: string): string {
  const { roster } = prepared;
  const settled = roster.columns.get(id as MeasuredId);
  const source = settled?.fromSource[object] ?? -1;
  if (settled && source >= 0) return `${roster.sources[source]!}, line ${settled.fromLine[object]!}`;
  return origin;
}
