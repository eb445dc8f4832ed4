import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const ROOT = resolve(import.meta.dirname, '../../..');
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-bad-'));
  for (const name of ['demo.halosieve.json', 'wide.csv', 'deep.tsv'])
    cpSync(join(ROOT, 'samples', name), join(folder, name));
});
afterAll(() => rmSync(folder, { recursive: true }));

interface Said {
  readonly code: number | null;
  readonly out: string;
  readonly err: string;
}

function halosieve(...words: string[]): Promise<Said> {
  return new Promise((done) => {
    const child = spawn(process.execPath, [join(ROOT, 'app/command/bin.mjs'), ...words], { cwd: folder });
    let [out, err] = ['', ''];
    child.stdout.setEncoding('utf8').on('data', (text: string) => (out += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (err += text));
    child.on('close', (code) => done({ code, out, err }));
  });
}

interface RecipeText {
  version: number;
  frame: string;
  sources: { path: string; columns: { column: string; role: string; unit?: string }[] }[];
  ledger: { parameters: Record<string, unknown>; rationale: string }[];
}

/** A variant of the demo recipe in the test's folder. */
function recipe(name: string, change: (recipe: RecipeText) => void): string {
  const text = JSON.parse(readFileSync(join(ROOT, 'samples/demo.halosieve.json'), 'utf8')) as RecipeText;
  change(text);
  writeFileSync(join(folder, name), JSON.stringify(text, null, 2));
  return name;
}

/** The program said no: one readable line that fits, no trace, exit code 1. */
function expectRefusal({ code, err }: Said, words: RegExp): void {
  expect(err).toMatch(words);
  expect(err).not.toMatch(/^\s+at /m);
  expect(code).toBe(1);
}

describe.concurrent('files that are no catalogues', () => {
  it.each([
    ['empty.csv', '', /^empty\.csv: the file has no rows.*Choose a file/],
    ['header.csv', 'name,ra,dec\n', /^header\.csv: the file has no rows.*a header without rows/],
    ['picture.csv', '\u0089PNG\r\n\u001a\n\u0000\u0000', /^picture\.csv: this is not a text table.*Export/],
    ['letter.csv', 'Dear colleague\nthis is prose\n', /^letter\.csv.*no table can be read here/],
    ['open.csv', 'name,ra,dec\n"A,1,2\nB,3,4\n', /^open\.csv, line 2: a quoted cell opens here.*Close the quote/],
  ])('%s', async (name, content, words) => {
    writeFileSync(join(folder, name), content);
    expectRefusal(await halosieve('inspect', name), words);
  });
});

describe.concurrent('cells that cannot be what they should', () => {
  it('words among numbers, values out of range and torn rows are named with file, line and column', async () => {
    const good = Array.from({ length: 16 }, (_, at) => `Good${at},${at},${-at},${1 + at},-1.5`);
    const rows = ['A,10,20,5.1,-1.2', 'B,30,95,7.5,-1.5', 'C,40,50,-3,-1.7', 'D,50', 'E,60,10,many,-2', ...good];
    writeFileSync(join(folder, 'cells.csv'), `name,ra,dec,distance [kpc],feh\n${rows.join('\n')}\n`);
    const { out, code } = await halosieve('inspect', 'cells.csv');
    expect(code).toBe(0);
    expect(out).toMatch(/cells\.csv, line 3, column dec: .*95/);
    expect(out).toMatch(/cells\.csv, line 5: the row has 2 cells where the header has 5 cells.*quarantine/);
    expect(out).toMatch(/cells\.csv, line 6, column distance \[kpc\]: .*"many"/);
    expect(out).toMatch(/cells\.csv, line 4, column distance \[kpc\]: .*-3/);
  });

  it('the same name twice in one catalogue keeps the first row and says so', async () => {
    const text = readFileSync(join(folder, 'wide.csv'), 'utf8').trimEnd();
    const last = text.split('\n').at(-1)!;
    writeFileSync(join(folder, 'twice.csv'), `${text}\n${last}\n`);
    const name = recipe('twice.halosieve.json', ({ sources }) => (sources[0]!.path = 'twice.csv'));
    expectRefusal(await halosieve('apply', name), /twice\.csv: the file is not the one that the recipe was made with/);
  });
});

describe.concurrent('recipes that cannot be followed', () => {
  it.each<[string, (recipe: RecipeText) => void, RegExp]>([
    [
      'from the future',
      (r) => (r.version = 99),
      /version 99, and this program reads version 1.*Update the program.*not changed/,
    ],
    ['with an unknown key', (r) => Object.assign(r, { colour: 'red' }), /colour, line \d+: .*unknown key "colour"/],
    [
      'with an unknown key in a cut',
      (r) => (r.ledger[0]!.parameters['maxx'] = 1),
      /ledger\[0\]\.parameters\.maxx, line \d+: .*expected one of: min, max/,
    ],
    ['with an unknown frame', (r) => (r.frame = 'G99'), /frame, line \d+: .*"G99".*G18/],
    [
      'whose source moved',
      (r) => (r.sources[0]!.path = 'elsewhere/wide.csv'),
      /elsewhere\/wide\.csv: there is no such file.*point the source to where the file is now/,
    ],
  ])('%s', async (what, change, words) => {
    const name = recipe(`${what.replaceAll(' ', '-')}.halosieve.json`, change);
    expectRefusal(await halosieve('apply', name), words);
  });

  it('that are no JSON', async () => {
    writeFileSync(join(folder, 'torn.halosieve.json'), '{ "halosieve": "recipe",,}');
    expectRefusal(
      await halosieve('apply', 'torn.halosieve.json'),
      /torn\.halosieve\.json, line 1, column 25: this is not JSON/,
    );
  });

  it('whose source changed name both hashes', async () => {
    writeFileSync(join(folder, 'changed.csv'), `${readFileSync(join(folder, 'wide.csv'), 'utf8')}#\n`);
    const name = recipe('changed.halosieve.json', ({ sources }) => (sources[0]!.path = 'changed.csv'));
    expectRefusal(
      await halosieve('apply', name),
      /changed\.csv: the file is not the one.*[0-9a-f]{64}.*[0-9a-f]{64}.*accept/,
    );
  });

  it('that give a role a wrong unit, or speak of a column that is not there, go on without it and say so', async () => {
    const unit = recipe('unit.halosieve.json', ({ sources }) => {
      sources[0]!.columns.find(({ role }) => role === 'distance_modulus')!.unit = 'km/s';
      sources[0]!.columns.find(({ role }) => role === 'name')!.column = 'nosuch';
    });
    const { code, out, err } = await halosieve('apply', unit);
    expect(code).toBe(0);
    expect(out + err).toMatch(/wide\.csv, column DistMod: the unit "km\/s" is not one of magnitude \(mag\).*left out/);
    expect(out + err).toMatch(/wide\.csv, column nosuch: .*the file does not have it/);
  });
});

describe.concurrent('freezing', () => {
  it('is refused without a rationale, and names the cut', async () => {
    const name = recipe('bare.halosieve.json', ({ ledger }) => (ledger[1]!.rationale = ' '));
    expectRefusal(
      await halosieve('freeze', name, '--out', 'bare'),
      /The cut "dust" is switched on without a rationale/,
    );
  });

  it('into a file instead of a folder is refused, and the file stays', async () => {
    writeFileSync(join(folder, 'taken'), 'mine');
    expectRefusal(
      await halosieve('freeze', 'demo.halosieve.json', '--out', 'taken'),
      /taken: .*a file has its name.*choose another/i,
    );
    expect(readFileSync(join(folder, 'taken'), 'utf8')).toBe('mine');
  });

  it('a verified edition that is none, or whose files were touched, is named', async () => {
    mkdirSync(join(folder, 'none'));
    expectRefusal(await halosieve('verify', 'none'), /none: this is not an edition: no SHA256SUMS/);
    const { code } = await halosieve('freeze', 'demo.halosieve.json', '--out', 'editions');
    expect(code).toBe(0);
    expect(readdirSync(join(folder, 'editions')).filter((name) => name.startsWith('.'))).toEqual([]);
    rmSync(join(folder, 'editions/edition-1/sample.ecsv'));
    const { code: after, out } = await halosieve('verify', 'editions/edition-1');
    expect([after, out]).toEqual([1, expect.stringMatching(/DIFFERS {2}sample\.ecsv/)]);
  });
});

it('a table that cannot be written where it should is refused in words', async () => {
  expectRefusal(
    await halosieve('derive', 'wide.csv', '--out', 'nowhere/x.csv'),
    /nowhere\/x\.csv: there is no folder to write it to \(it does not exist\).*Make the folder/,
  );
});
