import { writeFileSync } from 'node:fs';
import { jsonText } from '../../core/edition/jsontext';
import { recipeJsonSchema } from '../../core/edition/schema';

const target = new URL('../../core/edition/recipe.schema.json', import.meta.url);
writeFileSync(target, jsonText(recipeJsonSchema()));
console.log('wrote core/edition/recipe.schema.json');
