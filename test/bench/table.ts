import { execFileSync } from 'node:child_process';
import { join } from 'node:path';

/** Prints what was measured under its heading. */
export function show(heading: string, rows: readonly (readonly string[])[]): void {
  const widths = (rows[0] ?? []).map((_, at) => Math.max(...rows.map((row) => row[at]?.length ?? 0)) + 2);
  console.log(`\n${heading}`);
  for (const row of rows) console.log(`  ${row.map((cell, at) => cell.padEnd(widths[at] ?? 0)).join('')}`.trimEnd());
}

export function median(list: readonly number[]): number {
  return list.toSorted((p, q) => p - q)[list.length >> 1] ?? Number.NaN;
}

/** CPU seconds of all threads that some work takes. */
export function cpuSeconds(work: () => void): number {
  const begun = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(begun);
  return (user + system) / 1e6;
}

/** Runs a script of this folder with Debian's Python; undefined where it or astropy is not installed. */
export function python(script: string, ...args: readonly string[]): string | undefined {
  const path = join(process.env['HALOSIEVE_BENCH'] ?? import.meta.dirname, script);
  try {
    return execFileSync('/usr/bin/python3', [path, ...args], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });
  } catch {
    return undefined;
  }
}

export function times(ours: number, theirs: number | undefined): string {
  return theirs === undefined ? 'peer not here' : `${(theirs / ours).toFixed(1)} times as fast as the peer`;
}
