import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import { fail } from '../../core/table/problem';
import { fileProblem } from './files';

/** Holds a bench for this process. */
export interface BenchLock {
  release(): void;
}

/**
 * Takes the lock of a bench. A lock of a process that is gone is taken over.
 * Errors: bench-in-use with the number of the process that has it.
 */
export function lockBench(path: string, recipePath: string | undefined): BenchLock {
  for (let tries = 0; ; tries++) {
    try {
      mkdirSync(dirname(path), { recursive: true });
      writeFileSync(path, String(process.pid), { flag: 'wx' });
      return { release: () => rmSync(path, { force: true }) };
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw fileProblem(error, path, false);
    }
    const holder = holderOf(path);
    if ((holder !== undefined && processRuns(holder)) || tries > 5) {
      fail('bench-in-use', { where: recipePath, found: String(holder ?? 'unknown') });
    }
    rmSync(path, { force: true });
  }
}

/** Whether another program that runs has the lock. */
export function isHeld(path: string): boolean {
  const holder = holderOf(path);
  return holder !== undefined && processRuns(holder);
}

function holderOf(path: string): number | undefined {
  try {
    const pid = Number(readFileSync(path, 'utf8'));
    return Number.isInteger(pid) && pid > 0 ? pid : undefined;
  } catch {
    return undefined;
  }
}

/** Whether another process of that number runs; our own number is left over from an engine thread that died. */
export function processRuns(pid: number): boolean {
  if (pid === process.pid) return false;
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}
