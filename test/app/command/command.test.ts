import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const ROOT = resolve(import.meta.dirname, '../../..');
const DEMO = join(ROOT, 'samples/demo.halosieve.json');
let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'halosieve-command-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

function halosieve(...words: string[]): { code: number | null; out: string; err: string } {
  const { status, stdout, stderr } = spawnSync(process.execPath, [join(ROOT, 'app/command/bin.mjs'), ...words], {
    encoding: 'utf8',
  });
  return { code: status, out: stdout, err: stderr };
}

describe('use', () => {
  it.each([
    [[]],
    [['sift']],
    [['apply']],
    [['derive', DEMO]],
    [['derive', DEMO, '--out', 'x.csv', '--frame', 'G99']],
    [['apply', DEMO, '--what']],
  ])('misuse %j gives exit code 2 and a line, not a trace', (words) => {
    const { code, err } = halosieve(...words);
    expect(code).toBe(2);
    expect(err).not.toMatch(/^\s+at /m);
    expect(err.length).toBeGreaterThan(10);
  });

  it.each(['inspect', 'derive', 'apply', 'freeze', 'verify', 'open'])('%s --help names its JSON keys', (command) => {
    expect(halosieve(command, '--help')).toMatchObject({ code: 0, out: expect.stringMatching(/JSON keys/) });
  });

  it('a file that is not there gives exit code 1 and its name', () => {
    expect(halosieve('apply', 'nowhere.halosieve.json')).toMatchObject({
      code: 1,
      err: expect.stringMatching(/nowhere\.halosieve\.json.*no such file/),
    });
  });
});

it('inspect guesses the roles of the invented catalogue that the demo recipe writes out', () => {
  const { code, out } = halosieve('inspect', join(ROOT, 'samples/deep.tsv'), '--missing', '-99.9', '--json');
  expect(code).toBe(0);
  const found = JSON.parse(out) as {
    columns: { name: string; guess: { role: string; unit?: string } }[];
    rowsRead: number;
    rows: number;
  };
  const recipe = JSON.parse(readFileSync(DEMO, 'utf8')) as {
    sources: { columns: { column: string; role: string }[] }[];
  };
  for (const { column, role } of recipe.sources[1]!.columns) {
    expect(found.columns.find(({ name }) => name === column)!.guess.role).toBe(role);
  }
  expect([found.rowsRead, found.rows]).toEqual([112, 110]);
});

it('derive keeps the cells as they stand and adds every quantity, one row per input row, in order', () => {
  const input = join(folder, 'in.csv');
  const output = join(folder, 'out.csv');
  writeFileSync(
    input,
    'name,ra,dec,distance,pmra,pmdec,rv\nA,6.023792,-72.081306,4.520,5.253,-2.557,-17.45\nragged\n"B, ""b""",201.696991,-47.479473,5.43,,,\n',
  );
  expect(halosieve('derive', input, '--frame', 'G18', '--out', output).code).toBe(0);
  const [header, ...rows] = readFileSync(output, 'utf8').trimEnd().split('\n');
  expect(header).toMatch(/^name,ra,dec,distance_input,pmra,pmdec,rv,gal_l,gal_l_error,gal_b,/);
  expect(header).toMatch(/a_v,a_v_error$/);
  expect(rows).toHaveLength(3);
  expect(rows[0]).toMatch(/^A,6\.023792,-72\.081306,4\.520,/);
  expect(rows[1]).toMatch(/^ragged,+$/);
  expect(rows[2]).toMatch(/^"B, ""b""",/);
  const at = header!.split(',').indexOf('v_phi');
  // 47 Tuc, frame G18, recomputed with independent code; prograde positive.
  expect(Math.abs(Number(rows[0]!.split(',')[at]) - 180.644)).toBeLessThan(5.1e-4);
});

it('apply, freeze and verify agree, and verify says no with exit code 1 after a change', () => {
  const { counts } = JSON.parse(halosieve('apply', DEMO, '--json').out) as {
    counts: { sample: number; objects: number };
  };
  const frozen = halosieve(
    'freeze',
    DEMO,
    '--out',
    join(folder, 'editions'),
    '--time',
    '2026-01-02T03:04:05Z',
    '--json',
  );
  expect(JSON.parse(frozen.out)).toMatchObject({
    number: 1,
    sample: counts.sample,
    dropped: counts.objects - counts.sample,
  });
  const edition = join(folder, 'editions/edition-1');
  expect(halosieve('verify', edition)).toMatchObject({ code: 0, out: expect.stringMatching(/Nothing differs/) });
  expect(spawnSync('sha256sum', ['-c', '--quiet', 'SHA256SUMS'], { cwd: edition }).status).toBe(0);
  writeFileSync(join(edition, 'sample.csv'), `${readFileSync(join(edition, 'sample.csv'), 'utf8')}x\n`);
  expect(halosieve('verify', edition)).toMatchObject({ code: 1, out: expect.stringMatching(/DIFFERS {2}sample\.csv/) });
});
