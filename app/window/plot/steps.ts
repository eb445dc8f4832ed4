/** The nearest of 1, 2, 5 × 10ⁿ at or above a length. */
export function niceStep(length: number): number {
  const power = 10 ** Math.floor(Math.log10(length));
  const factor = [1, 2, 5, 10].find((candidate) => candidate * power >= length * (1 - 1e-9)) ?? 10;
  return factor * power;
}

/** A value rounded to a step, without the digits that rounding leaves behind. */
export function rounded(value: number, step: number): number {
  const decimals = Math.max(0, Math.ceil(-Math.log10(step)));
  return Number((Math.round(value / step) * step).toFixed(decimals));
}
