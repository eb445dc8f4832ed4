import type { App } from 'electron';
import type { Engine } from '../engine/engine';

/** Quits with the last window, and by whatever way only after the engine has put its work away. */
export function quitThroughEngine(app: Pick<App, 'on' | 'quit'>, engine: Engine, bug: (error: unknown) => void): void {
  let state: 'running' | 'closing' | 'closed' = 'running';
  app.on('window-all-closed', () => app.quit());
  // A quit from the menu or the system does not come by way of the last window; every one comes by here.
  app.on('will-quit', (event) => {
    if (state === 'closed') return;
    event.preventDefault();
    if (state === 'closing') return;
    state = 'closing';
    void closeEngine(engine)
      .catch(bug)
      .finally(() => {
        state = 'closed';
        app.quit();
      });
  });
}

async function closeEngine(engine: Engine): Promise<void> {
  await engine.handle('work.stop', {}).catch(() => undefined);
  await engine.close();
}
