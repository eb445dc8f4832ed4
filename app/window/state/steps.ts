import type { BenchView } from '../../contract/messages';
import { counted } from './words';

/** One stage of the way from files to an edition. */
export interface Step {
  readonly name: string;
  readonly says: string;
  /** Wanting: the user has to do something here first; ready: nothing is missing. */
  readonly state: 'wanting' | 'ready';
}

/** Where the bench stands on the way from sources to an edition. */
export function stepsOf(view: BenchView): Step[] {
  const { sources, counts, conflicts, quarantine, cuts, withoutRationale, lastEdition } = view;
  const unread = sources.filter(({ state }) => state !== 'read').length;
  const empty = counts.objects === 0;
  const doubts = [
    ...(conflicts.length > 0 ? [counted(conflicts.length, 'conflict')] : []),
    ...(quarantine.length > 0 ? [`${counted(quarantine.length, 'row')} in quarantine`] : []),
  ].join(' and ');
  const steps: [string, string, boolean][] = [
    [
      'Sources',
      sources.length === 0
        ? 'add a catalogue'
        : unread > 0
          ? `${unread} of ${counted(sources.length, 'source')} cannot be used`
          : counted(sources.length, 'source'),
      sources.length === 0 || unread > 0,
    ],
    [
      'Roster',
      empty
        ? sources.length === 0
          ? 'no objects yet'
          : 'no objects: give the columns their roles'
        : `${counted(counts.objects, 'object')}${doubts === '' ? '' : `; look at ${doubts}`}`,
      empty,
    ],
    [
      'Ledger',
      cuts.length === 0
        ? 'no cuts: everything is kept'
        : `${counted(cuts.length, 'cut')}${withoutRationale.length > 0 ? `; ${withoutRationale.length} without a rationale` : ', each with its rationale'}`,
      withoutRationale.length > 0,
    ],
    [
      'Freeze',
      lastEdition !== undefined
        ? `written: ${lastEdition.split(/[\\/]/).at(-1)}`
        : counts.sample === 0
          ? 'the sample is empty'
          : withoutRationale.length > 0
            ? 'waits for the rationale'
            : `${counted(counts.sample, 'object')} can be frozen`,
      counts.sample === 0 || withoutRationale.length > 0,
    ],
  ];
  return steps.map(([name, says, wanting]) => ({ name, says, state: wanting ? 'wanting' : 'ready' }));
}
