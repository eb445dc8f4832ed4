import { fileURLToPath, pathToFileURL } from 'node:url';
import { Worker, type WorkerOptions } from 'node:worker_threads';

/** Starts one of the engine's threads: the built entry, or the TypeScript file where the engine itself runs from source. */
export function startThread(name: 'enginethread' | 'loaderthread', options: WorkerOptions): Worker {
  const here = import.meta.url;
  if (here.endsWith('.ts')) {
    const file = fileURLToPath(new URL(`./${name}.ts`, here));
    const loader = JSON.stringify(import.meta.resolve('tsx/esm/api'));
    const entry = JSON.stringify(pathToFileURL(file).href);
    const boot = `import(${loader}).then(({ register }) => { register(); return import(${entry}); });`;
    return new Worker(new URL(`data:text/javascript,${encodeURIComponent(boot)}`), options);
  }
  // Built code stands in out/main or in a part below it.
  const folder = here.includes('/parts/') ? new URL('../', here) : new URL('./', here);
  return new Worker(new URL(`${name}.js`, folder), options);
}
