import type { BenchView } from '../../contract/messages';

/**
 * Names the objects and quantities that a view speaks of; what was fetched under one key is void under another. The
 * version alone does not tell: every bench, and every restarted engine, counts from one.
 */
export function dataKey({ recipePath, version, verdicts, recipe }: BenchView): string {
  const { sources, roster, frame, extinction } = recipe;
  return JSON.stringify([recipePath ?? '', version, verdicts.length, sources, roster, frame, extinction]);
}
