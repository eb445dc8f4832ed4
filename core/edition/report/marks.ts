import type { LedgerResult } from '../../cuts/result';
import { VERDICTS } from '../../cuts/result';
import { html, type Html } from './html';

/** How an object stands in a figure; borderline objects look different in and out of the sample. */
export interface Standing {
  readonly id: 'dropped' | 'unjudged' | 'kept' | 'borderline-out' | 'borderline-in';
  readonly label: string;
  /** Path of the mark, relative to its centre. */
  readonly path: string;
}

/** Every standing, in the order of drawing. They differ in shape and lightness, so that they hold without colour. */
export const STANDINGS: readonly Standing[] = [
  { id: 'dropped', label: 'dropped', path: 'm-2.6-2.6l5.2 5.2m0-5.2l-5.2 5.2' },
  { id: 'unjudged', label: 'unjudged', path: 'm0-3.6l3.5 6h-7z' },
  { id: 'kept', label: 'kept', path: 'm-2.9 0a2.9 2.9 0 1 0 5.8 0a2.9 2.9 0 1 0-5.8 0z' },
  { id: 'borderline-out', label: 'borderline, not in the sample', path: 'm0-4.6l4.6 4.6l-4.6 4.6l-4.6-4.6z' },
  { id: 'borderline-in', label: 'borderline, in the sample', path: 'm0-4.6l4.6 4.6l-4.6 4.6l-4.6-4.6z' },
];

/** The standing of one object. */
export function standingOf(judged: LedgerResult, object: number): Standing['id'] {
  const verdict = VERDICTS[judged.verdicts[object]!]!;
  if (verdict !== 'borderline') return verdict;
  return judged.sample.has(object) ? 'borderline-in' : 'borderline-out';
}

/** Small drawing of a mark, for legends and tables; the words stand beside it. */
export function markIcon(id: Standing['id']): Html {
  const { path } = STANDINGS.find((standing) => standing.id === id)!;
  return html`<svg class="icon" viewBox="-6 -6 12 12" aria-hidden="true">
    <path class="mark ${id}" d="M0 0${path}" />
  </svg>`;
}
