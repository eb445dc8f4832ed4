import { recipeText } from '../edition/recipefile';
import { deepCatalogue, wideCatalogue } from './catalogues';
import { clusters } from './clusters';
import { giantCatalogue, giants } from './giants';
import { demoRecipe, giantsRecipe } from './recipes';
import { truthTable } from './truth';

/** Seed of the demo; another one makes another Galaxy. */
export const DEMO_SEED = 20260101;

/**
 * Every file of the demo by name: catalogues, recipes, and the truth beside them. The same seed gives the same bytes.
 * @param sha256 hash of a text's UTF-8 bytes, hexadecimal
 */
export function demoFiles(sha256: (text: string) => string, seed = DEMO_SEED): ReadonlyMap<string, string> {
  const objects = clusters(seed);
  const stars = giants(seed + 1);
  const catalogues = new Map([
    ['wide.csv', wideCatalogue(objects, seed + 2)],
    ['deep.tsv', deepCatalogue(objects, seed + 3)],
    ['giants.csv', giantCatalogue(stars, seed + 4)],
  ]);
  const hash = (fileName: string): string => sha256(catalogues.get(fileName)!);
  return new Map([
    ...catalogues,
    ['truth/clusters.csv', truthTable(objects.map((object) => ({ ...object, label: object.name })))],
    ['truth/giants.csv', truthTable(stars.map((star) => ({ ...star, label: star.id })))],
    ['demo.halosieve.json', recipeText(demoRecipe(hash))],
    ['giants.halosieve.json', recipeText(giantsRecipe(hash))],
  ]);
}
