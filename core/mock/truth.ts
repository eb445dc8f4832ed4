import { csvRow } from '../formats/csv/write';
import { INVENTED } from './catalogues';
import type { Seen } from './observe';

const HEADER = ['name', 'population', 'x', 'y', 'z', 'v_x', 'v_y', 'v_z', 'feh', 'ebv', 'distance'];

/** What is true of invented objects, as CSV: Galactocentric kpc and km/s (right-handed), dex, mag, kpc. */
export function truthTable(objects: readonly (Seen & { readonly label: string })[]): string {
  const rows = objects.map(({ label, tracer, ebv, truth }) => [
    label,
    tracer.population,
    ...tracer.position.map((value) => value.toFixed(5)),
    ...tracer.velocity.map((value) => value.toFixed(3)),
    tracer.feh.toFixed(4),
    ebv.toFixed(4),
    truth.distance.toFixed(5),
  ]);
  return `# ${INVENTED}\n${csvRow(HEADER)}${rows.map(csvRow).join('')}`;
}
