/** A parallax gives a distance only when it is at least this many times its error. */
const LEAST_PARALLAX_SNR = 5;

/** Whether a distance may be taken from a parallax (mas, with its 1σ error): never from a noisy one, or one without error. */
export function givesDistance(parallax: number, sigma: number): boolean {
  return parallax > 0 && parallax >= LEAST_PARALLAX_SNR * sigma;
}
