import { describe, expect, test } from 'vitest';
import { assembleEdition } from '../../../core/edition/assemble';
import { EDITION_FILES } from '../../../core/edition/contents';
import { splitCsvLine } from '../../../core/edition/csvline';
import type { EditionInput } from '../../../core/edition/edition';
import { recipeText } from '../../../core/edition/recipefile';
import { cut, editionInput, smallRecipe, source, twoSources } from './fixture';

function fileOf(input: EditionInput, name: string): string {
  return assembleEdition(input).find((file) => file.name === name)!.text;
}

function table(input: EditionInput, name: string): Record<string, string>[] {
  const [header, ...lines] = fileOf(input, name)
    .trimEnd()
    .split('\n')
    .map((line) => splitCsvLine(line)!);
  return lines.map((cells) => Object.fromEntries(header!.map((column, at) => [column, cells[at]!])));
}

const ledger = [
  cut('metals', 'metallicity', { min: null, max: -1 }),
  cut('low', 'range', { quantity: 'gal_b', min: -30, max: null, absolute: false }),
  cut('far', 'range', { quantity: 'distance', min: null, max: 50, absolute: false }, { on: false }),
];
const input = editionInput(smallRecipe({ ledger }));

describe('the documents', () => {
  test('are those that the contents list, but for the checksums', () => {
    const listed = EDITION_FILES.map(({ name }) => name).filter((name) => name !== 'SHA256SUMS');
    expect(assembleEdition(input).map(({ name }) => name)).toEqual(listed);
  });

  test('the text of a document is its parts', () => {
    for (const file of assembleEdition(input)) expect([...file.parts()].join('')).toBe(file.text);
  });

  test('the recipe is the one that was given', () => {
    expect(fileOf(input, 'recipe.halosieve.json')).toBe(recipeText(input.recipe));
  });

  test('an empty sample, and a roster without objects, give documents all the same', () => {
    const nothing = editionInput(
      smallRecipe({ ledger: [cut('metals', 'metallicity', { min: 1, max: null }, { missing: 'drop' })] }),
    );
    expect(table(nothing, 'sample.csv')).toEqual([]);
    const none = editionInput(smallRecipe(), [source('near', [], { ra: [[]], dec: [[]] })]);
    expect(assembleEdition(none).every(({ text }) => text.length > 0)).toBe(true);
  });
});

describe('sample and dropped objects', () => {
  const sample = table(input, 'sample.csv');
  const dropped = table(input, 'dropped.csv');

  test('together are all objects, each once', () => {
    const keys = [...sample, ...dropped].map(({ key }) => key);
    expect(keys.toSorted()).toEqual([...input.roster.keys].toSorted());
  });

  test('every dropped object names all enabled cuts that it fails, and no other', () => {
    const ember1 = dropped.find(({ key }) => key === 'ember1')!;
    const ember3 = dropped.find(({ name }) => name === "'=Ember 3")!;
    expect(ember1).toMatchObject({ verdict: 'dropped', dropped_by: 'low', unjudged_by: '' });
    expect(ember3).toMatchObject({ verdict: 'dropped', dropped_by: 'metals' });
  });

  test('an unjudged object stands with the dropped, with the cut that cannot judge it', () => {
    expect(dropped.find(({ key }) => key === 'ember5')).toMatchObject({
      verdict: 'unjudged',
      dropped_by: '',
      unjudged_by: 'metals',
    });
  });

  test('a borderline object names the cut that decides', () => {
    const borderline = editionInput(smallRecipe(), twoSources());
    expect(table(borderline, 'sample.csv').find(({ key }) => key === 'ember2')).toMatchObject({
      verdict: 'borderline',
      borderline_by: 'metals',
    });
  });

  test('an object kept by name stays in the sample and says which list keeps it', () => {
    const objects = [{ key: 'ember5', name: 'Ember 5', action: 'keep' as const, reason: 'seen' }];
    const kept = editionInput(smallRecipe({ ledger: [...ledger, cut('eye', 'named', { objects })] }));
    expect(table(kept, 'sample.csv').find(({ key }) => key === 'ember5')).toMatchObject({ kept_by: 'eye' });
  });

  test('missing values are empty cells, never zero', () => {
    const cinder = sample.find(({ key }) => key === 'cinder9')!;
    expect(cinder).toMatchObject({ v_los: '', v_los_error: '', v_los_source: '', v_phi: '', speed: '' });
    expect(Number(cinder['r'])).toBeGreaterThan(40);
  });

  test('numbers read back to the same bits', () => {
    const r = input.quantities.column('r')!.values;
    for (const row of [...sample, ...dropped]) {
      const object = input.roster.keys.indexOf(row['key']!);
      expect(row['r'] === '' ? Number.NaN : Number(row['r'])).toBe(r[object]);
    }
  });

  test('every measured value says its source, every chosen one its measurement, every object its lines', () => {
    const ember2 = sample.find(({ key }) => key === 'ember2')!;
    expect(ember2).toMatchObject({
      feh_source: 'near',
      distance_from: 'distance_modulus',
      near_line: '3',
      far_line: '2',
    });
    const cinder = sample.find(({ key }) => key === 'cinder9')!;
    expect(cinder).toMatchObject({ feh_source: 'far', distance_from: 'distance', near_line: '', far_line: '3' });
    expect(cinder).toMatchObject({ distance_measured: '60', distance_measured_source: 'far' });
  });

  test('columns have distinct names, and no column is of errors that nobody knows', () => {
    const names = splitCsvLine(fileOf(input, 'dropped.csv').split('\n')[0]!)!;
    expect(new Set(names).size).toBe(names.length);
    expect(names).toContain('near.snr');
    expect(names).not.toContain('ra_error');
    expect(names).not.toContain('feh_error_minus');
  });

  test('a rescaled colour excess stands beside the measured one', () => {
    const sources = [source('near', ['A'], { ra: [[1]], dec: [[2]], ebv: [[0.5]] })];
    const scaled = editionInput(smallRecipe({ ledger: [], extinction: { rv: 3.1, recalibration: 0.86 } }), sources);
    const [row] = table(scaled, 'sample.csv');
    expect(row).toMatchObject({ ebv_measured: '0.5', ebv_measured_source: 'near', a_v_from: 'ebv' });
    expect(Number(row!['ebv'])).toBeCloseTo(0.43, 12);
  });

  test('errors that differ up and down are written', () => {
    const one = source('near', ['A'], { ra: [[1]], dec: [[2]], feh: [[-1.5], [0.2]] });
    const feh = { ...one.measured.columns.get('feh')!, minus: Float64Array.of(0.1), plus: Float64Array.of(0.3) };
    const measured = { rows: 1, columns: new Map([...one.measured.columns, ['feh' as const, feh]]) };
    const [row] = table(editionInput(smallRecipe({ ledger: [] }), [{ ...one, measured }]), 'sample.csv');
    expect(row).toMatchObject({ feh_error: '0.2', feh_error_minus: '0.1', feh_error_plus: '0.3' });
  });
});

describe('quarantine.csv', () => {
  const rows = table(input, 'quarantine.csv');

  test('holds unreadable and repeated rows with source, line, reason and text', () => {
    expect(rows).toMatchObject([
      { source: 'near', line: '7', kind: 'unreadable' },
      { source: 'far', line: '4', kind: 'duplicate', text: 'cinder 09' },
    ]);
    expect(rows[0]!['reason']).toMatch(/^The row has 2 cells where the header has 8 cells/);
    expect(rows[1]!['reason']).toContain('the row on line 3 is used');
  });

  test('text that a spreadsheet would run is made harmless', () => {
    expect(rows[0]!['text']).toBe("'=1+1,2");
  });
});

describe('edition.json', () => {
  test('says number, time, program, counts, sources, frame, attrition and conflicts', () => {
    const manifest = JSON.parse(fileOf(input, 'edition.json')) as Record<string, unknown>;
    expect(manifest).toMatchObject({
      halosieve: 'edition',
      number: 3,
      time: '2026-05-06T07:08:09.000Z',
      program: { version: '9.8.7', node: '20.0.0' },
      inventedSources: [],
      counts: input.judged.counts,
      sources: [
        { id: 'near', sha256: 'a'.repeat(64), bytes: 1234, rowsRead: 6, objectRows: 5, duplicates: 0, quarantine: 1 },
        { id: 'far', rowsRead: 3, objectRows: 2, duplicates: 1, quarantine: 0 },
      ],
      frame: { id: 'G18', r0Kpc: 8.122, sources: expect.arrayContaining(['2018A&A...615L..15G']) as unknown },
      attrition: [
        { cut: 'metals', kind: 'metallicity', on: true },
        { cut: 'low', kind: 'range' },
        { cut: 'far', on: false },
      ],
      conflicts: [{ key: 'ember2', quantity: 'feh', chosen: { source: 'near' }, other: { source: 'far', line: 2 } }],
    });
  });

  test('what is not known is null', () => {
    const old = editionInput(smallRecipe({ frame: 'IAU85' }));
    expect(JSON.parse(fileOf(old, 'edition.json'))).toMatchObject({ frame: { r0Kpc: 8.5, r0Sigma: null } });
  });
});

describe('README.md', () => {
  const readme = fileOf(input, 'README.md');

  test('explains every column of the sample and how to check the files', () => {
    for (const column of splitCsvLine(fileOf(input, 'sample.csv').split('\n')[0]!)!) {
      expect(readme).toContain(`| ${column.replaceAll('_', '\\_')} |`);
    }
    expect(readme).toContain('sha256sum -c SHA256SUMS');
    expect(readme).toContain('reason of metals');
  });

  test('says first that data are invented when they are', () => {
    const recipe = smallRecipe();
    const invented = { ...recipe, sources: recipe.sources.map((one) => ({ ...one, invented: one.id === 'far' })) };
    const text = fileOf(editionInput(invented), 'README.md');
    expect(text).toMatch(/^\*\*Invented data: far\./);
    expect(text).toContain('invented, do not cite');
    expect(readme).not.toContain('nvented');
  });

  test('text of the user cannot become markup', () => {
    const nasty = smallRecipe({ title: '# <b>A</b> | [x](y)\n- list' });
    expect(fileOf(editionInput(nasty), 'README.md')).toContain('# \\# \\<b\\>A\\</b\\> \\| \\[x\\](y) - list\n');
  });
});
