import type { VerdictCounts } from '../../../core/cuts/result';

/** What a plate shows, in a sentence for those who cannot see it. */
export function plateSummary(xTitle: string, yTitle: string, counts: VerdictCounts): string {
  const { objects, kept, borderline, dropped, unjudged } = counts;
  return `Plate of ${yTitle} over ${xTitle}: ${objects} objects, ${kept} kept, ${borderline} borderline, ${dropped} dropped, ${unjudged} unjudged.`;
}
