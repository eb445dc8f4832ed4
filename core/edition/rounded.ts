/**
 * A value rounded by its error, for reading: two digits of the error when it begins with 1 or 2, else one, and the
 * value to the same place: "−1.52 ± 0.13". Without an error, four significant digits. '' for NaN.
 */
export function measuredText(value: number, sigma: number): string {
  if (Number.isNaN(value)) return '';
  if (!(sigma > 0) || !Number.isFinite(sigma)) return plainText(value);
  const places = errorPlaces(sigma);
  return `${fixed(value, places)} ± ${fixed(sigma, places)}`;
}

/** A number to four significant digits with a true minus sign; integers as they are. '' for NaN. */
export function plainText(value: number): string {
  if (Number.isNaN(value)) return '';
  if (value === 0) return '0';
  const text = Number.isInteger(value) && Math.abs(value) < 1e6 ? String(value) : String(Number(value.toPrecision(4)));
  return text.replace('-', '−');
}

/** Digits behind the point that an error of this size calls for; negative for tens, hundreds, … */
function errorPlaces(sigma: number): number {
  const power = Math.floor(Math.log10(sigma));
  const lead = sigma / 10 ** power;
  return lead < 2.95 ? 1 - power : -power;
}

function fixed(value: number, places: number): string {
  const shown =
    places >= 0 ? value.toFixed(Math.min(places, 20)) : String(Math.round(value / 10 ** -places) * 10 ** -places);
  const text = Number(shown) === 0 ? shown.replace('-', '') : shown;
  return text.replace('-', '−');
}
