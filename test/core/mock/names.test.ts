import { expect, test } from 'vitest';
import { dice } from '../../../core/mock/dice';
import { clusterName, respelled } from '../../../core/mock/names';
import { cleanName } from '../../../core/roster/cleanname';

test('no two of the invented clusters share a key, and every respelling keeps it', () => {
  const d = dice(5);
  const names = Array.from({ length: 400 }, (_, at) => clusterName(at));
  expect(new Set(names.map(cleanName)).size).toBe(400);
  for (const name of names) expect(cleanName(respelled(name, d))).toBe(cleanName(name));
});
