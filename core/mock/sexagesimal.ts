/** "hh:mm:ss.sss" of an angle in degrees, [0, 360]; what rounds to 24 hours is 0. */
export function hoursText(degrees: number): string {
  return parts(degrees / 15, 3).replace(/^24/, '00');
}

/** "±dd:mm:ss.ss" of an angle in degrees. */
export function degreesText(degrees: number): string {
  return `${degrees < 0 ? '-' : '+'}${parts(Math.abs(degrees), 2)}`;
}

function parts(value: number, decimals: number): string {
  // Rounded first, so that 59.9996 s does not become 60.000.
  const unit = 10 ** decimals;
  const total = Math.round(value * 3600 * unit);
  const seconds = (total % (60 * unit)) / unit;
  const minutes = Math.floor(total / (60 * unit)) % 60;
  const whole = Math.floor(total / (3600 * unit));
  const two = (n: number): string => String(n).padStart(2, '0');
  return `${two(whole)}:${two(minutes)}:${seconds.toFixed(decimals).padStart(3 + decimals, '0')}`;
}
