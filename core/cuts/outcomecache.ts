import { allOf, anyOf } from './combine';
import type { Judged, Outcome } from './contract';
import type { Cut } from './cut';
import { cutKind } from './kinds';
import { settled } from './missing';

/** Remembers the last outcome of every cut, so that a moved limit evaluates one cut. */
export interface OutcomeCache {
  outcome(cut: Cut, objects: Judged, margin: number): Outcome;
}

/** A cache for one set of objects after another; it forgets when the objects change. */
export function outcomeCache(): OutcomeCache {
  let of: Judged | undefined;
  let kept = new Map<string, { key: string; outcome: Outcome }>();
  return {
    outcome(cut, objects, margin) {
      if (of !== objects) {
        of = objects;
        kept = new Map();
      }
      const key = JSON.stringify([cut.kind, cut.parameters, cut.missing, margin]);
      const known = kept.get(cut.id);
      if (known?.key === key) return known.outcome;
      const outcome = judgeCut(cut, objects, margin);
      kept.set(cut.id, { key, outcome });
      return outcome;
    },
  };
}

/** What one cut says of every object; the rule for missing values holds for each of its tests. */
export function judgeCut(cut: Cut, objects: Judged, margin: number): Outcome {
  const kind = cutKind(cut.kind);
  const tests = kind.judge(cut.parameters, objects, margin).map((test) => settled(test, cut.missing));
  return kind.passing(cut.parameters) === 'every' ? allOf(objects.rows, tests) : anyOf(objects.rows, tests);
}
