import { fail } from '../table/problem';

const LINE = /^([0-9a-f]{64}) [ *](.+)$/;

/** Text of SHA256SUMS as `sha256sum -c` reads it, sorted by file name. */
export function sumsText(hashes: ReadonlyMap<string, string>): string {
  const names = [...hashes.keys()].sort();
  return names.map((name) => `${hashes.get(name)!}  ${name}\n`).join('');
}

/** Hash per file name of a SHA256SUMS text. Throws ProblemError `edition-differs` for a line that is not of that form. */
export function parseSums(text: string): Map<string, string> {
  const hashes = new Map<string, string>();
  text.split(/\r?\n/).forEach((line, at) => {
    if (line === '') return;
    const match = LINE.exec(line);
    if (!match) {
      fail('edition-differs', { where: 'SHA256SUMS', line: at + 1, found: 'a line that is no hash and file name' });
    }
    hashes.set(match[2]!, match[1]!);
  });
  return hashes;
}
