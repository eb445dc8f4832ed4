import { execFileSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { parseSums, sumsText } from '../../../core/edition/sums';
import type { ProblemError } from '../../../core/table/problem';

/** Debian's coreutils. */
const CHECKER = 'sha256sum';

const hash = (text: string): string => createHash('sha256').update(text).digest('hex');

describe('SHA256SUMS', () => {
  test('is empty for no files and reads back as nothing', () => {
    expect(sumsText(new Map())).toBe('');
    expect(parseSums('').size).toBe(0);
  });

  test('is sorted by name and reads back', () => {
    const hashes = new Map([
      ['b.csv', hash('b')],
      ['a.csv', hash('a')],
    ]);
    expect(sumsText(hashes)).toBe(`${hash('a')}  a.csv\n${hash('b')}  b.csv\n`);
    expect(parseSums(sumsText(hashes))).toEqual(hashes);
  });

  test('the mark of binary mode and line ends of other systems are understood', () => {
    expect(parseSums(`${hash('a')} *a.csv\r\n`)).toEqual(new Map([['a.csv', hash('a')]]));
  });

  test('a line of another form is refused with its number', () => {
    const text = `${hash('a')}  a.csv\nnonsense\n`;
    const problems = [expect.objectContaining({ code: 'edition-differs', line: 2 }) as unknown];
    expect(() => parseSums(text)).toThrow(expect.objectContaining({ problems }) as ProblemError);
  });

  test('sha256sum itself accepts it', () => {
    const folder = mkdtempSync(join(tmpdir(), 'halosieve-sums-'));
    try {
      writeFileSync(join(folder, 'a.csv'), 'a');
      writeFileSync(join(folder, 'SHA256SUMS'), sumsText(new Map([['a.csv', hash('a')]])));
      expect(execFileSync(CHECKER, ['-c', 'SHA256SUMS'], { cwd: folder, encoding: 'utf8' })).toContain('a.csv: OK');
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});
