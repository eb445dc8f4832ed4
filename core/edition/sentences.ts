import type { EditionInput } from './edition';
import { frameOf, frameValue } from './framewords';

/** "1 object", "2 objects". */
export function counted(count: number, noun: string, plural = `${noun}s`): string {
  return `${count} ${count === 1 ? noun : plural}`;
}

/** "2026-01-02 03:04:05 UTC" of an ISO 8601 time in UTC; any other text as it is. */
export function readableTime(time: string): string {
  const match = /^(\d{4}-\d\d-\d\d)T(\d\d:\d\d:\d\d)(?:\.\d+)?Z$/.exec(time);
  return match ? `${match[1]!} ${match[2]!} UTC` : time;
}

/** What the sample is and how it came about, as a referee would read it; made from the recipe and the counts alone. */
export function jobParagraph(input: EditionInput): string {
  const { recipe, judged } = input;
  const { counts } = judged;
  const frame = frameOf(recipe.frame);
  const catalogues = recipe.sources.map((source) => `${source.title.trim() || source.id} (${source.id})`);
  return [
    `The sample holds ${counts.sample} of ${counted(counts.objects, 'object')} from ${listed(catalogues) || 'no catalogue'}.`,
    mergeSentence(input),
    `Positions and velocities are Galactocentric in the solar frame ${frame.id} (R0 = ${frameValue(frame.r0Kpc, frame.r0Sigma, 'kpc')}); v_phi and l_z are positive prograde.`,
    `Where A_V was not measured it is R_V × E(B−V) with R_V = ${recipe.extinction.rv}` +
      `${recipe.extinction.recalibration === 1 ? '' : `, after E(B−V) was multiplied by ${recipe.extinction.recalibration}`}.`,
    cutsSentence(input),
    borderlineSentence(input),
    counts.unjudged === 0
      ? ''
      : `${counted(counts.unjudged, 'object')} could not be judged for want of a value and ${counts.unjudged === 1 ? 'is' : 'are'} not in the sample.`,
  ]
    .filter((sentence) => sentence !== '')
    .join(' ');
}

function mergeSentence({ recipe }: EditionInput): string {
  if (recipe.sources.length < 2) return '';
  const { matchNames, matchRadiusArcsec, priority } = recipe.roster;
  const names = matchNames ? 'when their cleaned names agree or ' : '';
  const first =
    priority.length > 0 ? ` that has it, in the order ${priority.join(', ')}` : ' that has it, in their order';
  return `Rows of different catalogues are one object ${names}when they stand within ${matchRadiusArcsec}″ on the sky; each value is that of the first catalogue${first}.`;
}

function cutsSentence({ recipe, judged }: EditionInput): string {
  const enabled = judged.attrition.filter(({ on }) => on);
  if (enabled.length === 0) return 'No cut was applied.';
  const parts = enabled.map(
    ({ cut, describe, inTurn }, at) => `(${at + 1}) ${cut}: ${describe}, which removes ${inTurn}`,
  );
  const off = recipe.ledger.length - enabled.length;
  const rest =
    off === 0 ? '' : ` ${counted(off, 'further cut')} of the ledger ${off === 1 ? 'is' : 'are'} switched off.`;
  return `The cuts, in turn: ${parts.join('; ')}.${rest}`;
}

function borderlineSentence({ recipe, judged }: EditionInput): string {
  const { borderline, kept, sample } = judged.counts;
  if (recipe.borderlineSigma === 0) return 'No margin was set: every verdict is that of the best values.';
  const of = `An object is borderline when values wrong by ${recipe.borderlineSigma} σ could turn its verdict`;
  return `${of}: ${borderline} ${borderline === 1 ? 'is' : 'are'}, and ${sample - kept} of them, which ${sample - kept === 1 ? 'passes' : 'pass'} at best values, ${sample - kept === 1 ? 'is' : 'are'} in the sample.`;
}

function listed(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} and ${items.at(-1)!}`;
}
