/** One key press may arrive several times: from the terminal, and passed on by npm. */
const SAME_PRESS_MS = 1000;

/** The signal that Ctrl-C or the system stops the program by; pressed again later, it ends the program at once. */
export function stopper(note: (line: string) => void): AbortSignal {
  const stop = new AbortController();
  let since: number | undefined;
  const pressed = (): void => {
    if (since === undefined) {
      since = performance.now();
      setTimeout(() => note('Stopping. Ctrl-C once more ends the program at once.'), 2 * SAME_PRESS_MS).unref();
      stop.abort();
    } else if (performance.now() - since > SAME_PRESS_MS) process.exit(130);
  };
  process.on('SIGINT', pressed);
  process.on('SIGTERM', pressed);
  return stop.signal;
}
