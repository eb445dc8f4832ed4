import type { WriteStream } from 'node:tty';
import type { Progress } from '../contract/messages';

const PATIENCE_MS = 500;
const SPARSE_MS = 5000;

/** Shows long work on a stream: one changing line on a terminal, a line now and then elsewhere, nothing for short work. */
export function progressLine(stream: WriteStream): { show: (progress: Progress) => void; clear: () => void } {
  const begun = performance.now();
  let [last, drawn] = [begun, false];
  return {
    show({ label, share }) {
      const now = performance.now();
      const gap = stream.isTTY ? 100 : SPARSE_MS;
      if (now - begun < PATIENCE_MS || now - last < gap) return;
      last = now;
      const line = share === undefined ? label : `${label} ${Math.round(100 * share)} %`;
      stream.write(stream.isTTY ? `\r\x1b[K${line}` : `${line}\n`);
      drawn = stream.isTTY;
    },
    clear() {
      if (drawn) stream.write('\r\x1b[K');
      drawn = false;
    },
  };
}
