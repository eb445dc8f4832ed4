import type { VerdictCounts } from '../../../core/cuts/result';
import { count, counted } from '../state/words';

/** What a plate shows, in a sentence for those who cannot see it. */
export function plateSummary(xTitle: string, yTitle: string, counts: VerdictCounts): string {
  const { objects, kept, borderline, dropped, unjudged } = counts;
  return `Plate of ${yTitle} over ${xTitle}: ${counted(objects, 'object')}, ${count(kept)} kept, ${count(borderline)} borderline, ${count(dropped)} dropped, ${count(unjudged)} unjudged.`;
}
