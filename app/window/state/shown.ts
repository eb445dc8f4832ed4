/** A value for a table: four digits that matter, a dash where it is missing. */
export function shown(value: number): string {
  if (Number.isNaN(value)) return '–';
  const digits = Math.abs(value) >= 1000 ? value.toFixed(0) : value.toPrecision(4);
  return digits.replace('-', '−');
}

/** A value with its error, rounded so that the error keeps two digits. */
export function withError(value: number, sigma: number): string {
  if (!(sigma > 0) || !Number.isFinite(sigma)) return shown(value);
  const decimals = Math.min(8, Math.max(0, 1 - Math.floor(Math.log10(sigma))));
  return `${value.toFixed(decimals)} ± ${sigma.toFixed(decimals)}`.replace(/^-/, '−');
}
