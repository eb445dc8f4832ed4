import { faultLines } from './fault';

/** Lines to the program's two streams; a line of progress that stands there is taken away first. */
export interface Output {
  readonly print: (line: string) => void;
  readonly note: (line: string) => void;
}

/** The streams of this process. When nobody reads them any more, or they are full, the process ends without a trace. */
export function standardOutput(clear: () => void): Output {
  const write = (stream: NodeJS.WriteStream) => (line: string) => {
    clear();
    stream.write(`${line}\n`);
  };
  const note = write(process.stderr);
  process.stdout.on('error', ({ code = 'unknown reason' }: NodeJS.ErrnoException) => {
    if (code !== 'EPIPE') note(`The answer could not be written (${code}).`);
    process.exit(code === 'EPIPE' ? 0 : 1);
  });
  process.stderr.on('error', () => undefined);
  process.on('uncaughtException', (error) => {
    faultLines(error).forEach(note);
    process.exit(1);
  });
  return { print: write(process.stdout), note };
}
