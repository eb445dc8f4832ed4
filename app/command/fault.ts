/** What is said of a failure that is not the input's: one line, how to report it, and where it happened if asked for. */
export function faultLines(error: unknown, env: NodeJS.ProcessEnv = process.env): string[] {
  const [message, trace] = error instanceof Error ? [error.message, error.stack ?? ''] : [String(error), ''];
  const lines = [
    `halosieve failed: ${message.split('\n')[0]!}`,
    'This is a fault of the program. Please report it with what you did; HALOSIEVE_DEBUG=1 shows where it happened.',
  ];
  return env['HALOSIEVE_DEBUG'] === '1' ? [...lines, trace] : lines;
}
