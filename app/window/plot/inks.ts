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
