/** What decides whether an invented survey lists an object: true modulus (mag), colour excess (mag), latitude (degrees). */
export interface Sight {
  readonly modulus: number;
  readonly ebv: number;
  readonly b: number;
}

/** Chance that the wide survey lists a cluster: it loses what is far or behind dust. */
export function wideChance({ modulus, ebv }: Sight): number {
  return (modulus > 17.5 ? 0.45 : 0.9) * (ebv > 1.5 ? 0.7 : 1);
}

/** Chance that the deep survey lists a cluster: it loses what is near the plane. */
export function deepChance({ b }: Sight): number {
  return Math.abs(b) < 8 ? 0.3 : 0.85;
}

/** Chance that the survey of giants lists a star: it fades behind dust, and by half at a true modulus of 19. */
export function giantChance({ modulus, ebv }: Sight): number {
  return Math.exp(-Math.max(0, ebv - 0.1) / 0.8) / (1 + Math.exp((modulus - 19) / 0.4));
}
