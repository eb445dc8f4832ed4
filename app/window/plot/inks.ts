import type { Tones } from './raster';
import type { Inks } from './marks';

/** A colour of the style sheet as it stands now. */
export function plainColour(name: string): string {
  return getComputedStyle(document.documentElement).getPropertyValue(name).trim();
}

/** The colours of the verdicts. */
export function inksOf(): Inks {
  return {
    kept: plainColour('--kept'),
    borderline: plainColour('--borderline'),
    dropped: plainColour('--dropped'),
    unjudged: plainColour('--unjudged'),
  };
}

/** The tones of a density: few to many. */
export function tonesOf(): Tones {
  return {
    dropped: [plainColour('--dropped-few'), plainColour('--dropped-many')],
    sample: [plainColour('--sample-few'), plainColour('--sample-many')],
  };
}
