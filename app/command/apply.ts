import { judgeLedger } from '../../core/cuts/ledger';
import { problemText } from '../../core/table/wording';
import { conflictText } from '../engine/views';
import type { Command } from './command';
import { openRecipe } from './openrecipe';
import { textTable } from './texttable';

/** halosieve apply */
export const apply: Command = {
  name: 'apply',
  usage: 'halosieve apply RECIPE [--json]',
  summary: 'Judges every object by the ledger of a recipe and prints the attrition.',
  options: {},
  details: [
    'Each cut: removed in turn, alone, and only by it; unjudged for want of a value; left after it.',
    'JSON keys: title, counts{objects, kept, borderline, dropped, unjudged, sample},',
    '  attrition[{cut, on, describe, inTurn, alone, onlyByIt, unjudged, left}],',
    '  sources[{source, rowsRead, objectRows, duplicates, quarantine}], conflicts[…], problems[…]',
  ],
  words: [1, 1],
  async run(invocation) {
    const { words, values, print, note } = invocation;
    const { recipe, objects, roster } = await openRecipe(words[0]!, invocation);
    const { counts, attrition } = judgeLedger(recipe.ledger, objects, { margin: recipe.borderlineSigma });
    const problems = [...roster.problems, ...roster.quarantine.map(({ reason }) => reason)];
    const conflicts = roster.conflicts.map((conflict) => conflictText(conflict, roster.names));
    if (values['json']) {
      const worded = problems.map((problem) => ({ ...problem, text: problemText(problem) }));
      print(
        JSON.stringify(
          { title: recipe.title, counts, attrition, sources: roster.counts, conflicts, problems: worded },
          null,
          2,
        ),
      );
      return 0;
    }
    const rows = attrition.map(({ cut, on, inTurn, alone, onlyByIt, unjudged, left, describe }) => [
      cut,
      on ? 'on' : 'off',
      ...[inTurn, alone, onlyByIt, unjudged, left].map(String),
      describe,
    ]);
    print(recipe.title);
    if (recipe.sources.some(({ invented }) => invented)) print('INVENTED DATA');
    print('');
    for (const line of textTable(['cut', '', 'in turn', 'alone', 'only by it', 'unjudged', 'left', 'keeps'], rows))
      print(line);
    print('');
    const { kept, dropped, borderline, unjudged, sample } = counts;
    print(
      `${counts.objects} objects: ${kept} kept, ${dropped} dropped, ${borderline} borderline, ${unjudged} unjudged; ${sample} in the sample`,
    );
    for (const problem of problems) note(problemText(problem));
    for (const conflict of conflicts) note(`Conflict: ${conflict}`);
    return 0;
  },
};
