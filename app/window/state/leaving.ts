import type { BenchState } from './bench.svelte';
import { commitFields } from './edits';

/** What the window does when it is about to be closed: sends what is typed, and asks first where that is impossible. */
export function leaving(bench: BenchState): (event: BeforeUnloadEvent) => void {
  return (event) => {
    commitFields();
    bench.outbox.hurry();
    if (!bench.connected && bench.outbox.waiting > 0) event.preventDefault();
  };
}
