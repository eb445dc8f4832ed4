import { describe, expect, test } from 'vitest';
import { assembleEdition } from '../../../core/edition/assemble';
import { compareFiles } from '../../../core/edition/compare';
import { editionFile } from '../../../core/edition/edition';
import { editionInput } from './fixture';

const rebuilt = assembleEdition(editionInput());
const frozen = (): Map<string, string> => new Map(rebuilt.map(({ name, text }) => [name, text]));

describe('comparing an edition with its rebuilding', () => {
  test('nothing differs from itself, and SHA256SUMS is left to the hashes', () => {
    expect(compareFiles(frozen().set('SHA256SUMS', 'whatever'), rebuilt)).toEqual([]);
  });

  test('a file that is missing and one that was added are named', () => {
    const files = frozen().set('notes.txt', '');
    files.delete('sample.csv');
    expect(compareFiles(files, rebuilt)).toEqual([
      { file: 'sample.csv', kind: 'missing' },
      { file: 'notes.txt', kind: 'unexpected' },
    ]);
  });

  test.each(['sample.csv', 'sample.ecsv'])(
    'a changed cell of %s is found with line, column, object and both values',
    (name) => {
      const files = frozen();
      const lines = files.get(name)!.split('\n');
      const header = lines.findIndex((line) => !line.startsWith('#'));
      const at = lines.findIndex((line) => /^"?ember2/.test(line));
      const column = lines[header]!.replaceAll('"', '').split(',').indexOf('feh');
      const cells = lines[at]!.split(',');
      const old = cells[column]!;
      cells[column] = '-9.25';
      lines[at] = cells.join(',');
      files.set(name, lines.join('\n'));
      expect(compareFiles(files, rebuilt)).toEqual([
        { file: name, kind: 'differs', line: at + 1, column: 'feh', row: 'ember2', found: '-9.25', rebuilt: old },
      ]);
    },
  );

  test('a removed last line is found as the end of the file', () => {
    const files = frozen();
    const text = files.get('README.md')!;
    files.set('README.md', text.slice(0, text.trimEnd().lastIndexOf('\n') + 1));
    const [difference] = compareFiles(files, rebuilt);
    expect(difference).toMatchObject({ file: 'README.md', kind: 'differs', found: 'the end of the file' });
  });

  test('of documents that are no tables the first differing line is shown', () => {
    const file = editionFile('a.json', () => ['{\n', '  "a": 1\n', '}\n']);
    expect(compareFiles(new Map([['a.json', '{\n  "a": 2\n}\n']]), [file])).toEqual([
      { file: 'a.json', kind: 'differs', line: 2, found: '  "a": 2', rebuilt: '  "a": 1' },
    ]);
  });

  test('a file that is wholly empty differs in line 1', () => {
    const file = editionFile('a.csv', () => ['key\n']);
    expect(compareFiles(new Map([['a.csv', '']]), [file])).toMatchObject([{ line: 1, found: 'the end of the file' }]);
  });
});
