import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { assembleEdition } from '../../../core/edition/assemble';
import { sampleColumns } from '../../../core/edition/columns';
import { yamlText } from '../../../core/formats/ecsv/yaml';
import type { Column } from '../../../core/table/column';
import { cut, editionInput, smallRecipe } from '../../core/edition/fixture';

const PYTHON = '/usr/bin/python3';
const hasAstropy = spawnSync(PYTHON, ['-c', 'import astropy']).status === 0;

interface Read {
  readonly meta: Record<string, unknown>;
  readonly columns: readonly {
    readonly name: string;
    readonly kind: string;
    readonly unit: string | null;
    readonly dimension: string | null;
    readonly description: string | null;
    readonly ucd: string | null;
    readonly cells: readonly (string | null)[];
  }[];
}

const nasty = ['#Ember 1', 'Ember "2", é', '=Ember 3', "N'", 'null'];
const input = ((): ReturnType<typeof editionInput> => {
  const made = editionInput(
    smallRecipe({
      title: 'Ω: "halo" # 1',
      ledger: [cut('all', 'range', { quantity: 'r', min: null, max: null, absolute: false })],
    }),
  );
  const names = made.roster.names.map((name, object) => nasty[object] ?? name);
  return { ...made, roster: { ...made.roster, names } };
})();

function readByAstropy(text: string): Read {
  const folder = mkdtempSync(join(tmpdir(), 'halosieve-ecsv-'));
  try {
    const path = join(folder, 'table.ecsv');
    writeFileSync(path, text);
    const script = join(import.meta.dirname, 'read.py');
    return JSON.parse(execFileSync(PYTHON, [script, path], { encoding: 'utf8', maxBuffer: 1 << 26 })) as Read;
  } finally {
    rmSync(folder, { recursive: true });
  }
}

/** Value of a double that Python wrote in hexadecimal, exactly. */
function fromHex(text: string): number {
  const [, sign, whole, fraction = '', power] = /^(-?)0x([01])(?:\.([0-9a-f]+))?p([+-]\d+)$/.exec(text)!;
  const digits = Number.parseInt(whole! + fraction, 16);
  return (sign === '-' ? -1 : 1) * digits * 2 ** (Number(power) - 4 * fraction.length);
}

if (!hasAstropy) test.skip("Debian's python3-astropy is not installed: no other program has read our ECSV");

describe.skipIf(!hasAstropy)('astropy reads the ECSV of a sample, with warnings as errors', () => {
  const text = assembleEdition(input).find(({ name }) => name === 'sample.ecsv')!.text;
  const read = hasAstropy ? readByAstropy(text) : { meta: {}, columns: [] };
  const written = sampleColumns(input);
  const rows = [...input.judged.sample.rows()];
  const pairs = written.map((column, at) => ({ ...column, read: read.columns[at]! }));

  test('there are rows, and the columns are ours in our order', () => {
    expect(rows.length).toBe(input.roster.rows);
    expect(read.columns.map(({ name }) => name)).toEqual(written.map(({ column }) => column.name));
  });

  test('every number is the same double, every missing cell is masked', () => {
    for (const { column, integer, read: found } of pairs) {
      if (column.type !== 'number') continue;
      const values = rows.map((row) => column.values[row]!);
      const back = found.cells.map((cell) => (cell === null ? Number.NaN : integer ? Number(cell) : fromHex(cell)));
      expect([column.name, back]).toEqual([column.name, values]);
      // A column of which every cell is missing may lose its mask, not its kind.
      expect([column.name, found.kind]).toEqual([column.name, integer ? 'i' : 'f']);
    }
  });

  test('every text is the same, line by line', () => {
    const cell = (column: Column, row: number): string | null =>
      column.type === 'text' && column.codes[row]! >= 0 ? column.dictionary[column.codes[row]!]! : null;
    for (const { column, read: found } of pairs) {
      if (column.type === 'text')
        expect([column.name, found.cells]).toEqual([column.name, rows.map((row) => cell(column, row))]);
    }
  });

  test('descriptions and UCDs arrive, and so do the units, of the right dimension', () => {
    for (const { column, ucd, read: found } of pairs) {
      if (column.unit !== 'odd unit') expect(found.description ?? '').toBe(column.description ?? '');
      expect(found.ucd ?? '').toBe(ucd);
    }
    const dimension = (name: string): string | null => read.columns.find((column) => column.name === name)!.dimension;
    expect(dimension('x')).toBe('length');
    expect(dimension('v_phi_error')).toContain('speed');
    expect(dimension('pm_ra')).toContain('angular');
    expect(dimension('gal_l')).toBe('angle');
    expect(dimension('l_z')).toContain('diffusivity');
    expect(dimension('feh')).toBeNull();
  });

  test('a unit that nobody understands is told in the description', () => {
    const odd = read.columns.find(({ name }) => name === 'near.snr')!;
    expect(odd).toMatchObject({
      unit: null,
      description: 'as the source has it; unit as the source writes it: odd unit',
    });
  });

  test('the table says what it is', () => {
    expect(read.meta).toMatchObject({ title: 'Ω: "halo" # 1', solar_frame: 'G18' });
  });
});

test.skipIf(!hasAstropy)('any text is read back as itself by the YAML 1.1 that astropy uses', () => {
  const texts = [
    'no',
    '2020-01-01',
    '1_000',
    '~',
    'a\u2028b\u0085c',
    '\u0007',
    '\ud83d\ude00 𝜎',
    'x: y # z',
    "it's",
    '\ufeff',
    '\\',
    '',
  ];
  const program = 'import json, sys, yaml; print(json.dumps(yaml.safe_load(sys.stdin.read())))';
  const document = `[${texts.map(yamlText).join(', ')}]`;
  expect(JSON.parse(execFileSync(PYTHON, ['-c', program], { input: document, encoding: 'utf8' }))).toEqual(texts);
});
