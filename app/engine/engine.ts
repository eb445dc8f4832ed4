import { ProblemError } from '../../core/table/problem';
import type { RequestName, Requests } from '../contract/messages';
import { Bench } from './bench';
import { plateDensity } from './density';
import { freeze } from './freeze';
import type { EngineHost, Heard } from './host';
import { cutHistogram } from './histogram';
import { listFolder } from './folder';
import { objectCard } from './objectcard';
import { rosterRows } from './rosterrows';
import { sourcePreview } from './preview';

/** Owns one bench and answers windows; the same for every door. */
export interface Engine {
  /** Rejects with ProblemError when the input is to blame. */
  handle<Name extends RequestName>(name: Name, params: Requests[Name]['params']): Promise<Requests[Name]['result']>;
  listen(heard: Heard): () => void;
  close(): Promise<void>;
}

type Handlers = {
  [Name in RequestName]: (
    params: Requests[Name]['params'],
  ) => Requests[Name]['result'] | Promise<Requests[Name]['result']>;
};

/** An engine without a bench; windows open one. */
export function createEngine(host: EngineHost): Engine {
  const listeners = new Set<Heard>();
  const tell: Heard = (name, data) => listeners.forEach((heard) => heard(name, data));
  const bench = new Bench(host, tell);
  let queue: Promise<unknown> = Promise.resolve();

  /** Runs changes one after another, in the order in which they were asked for. */
  function inTurn<T>(work: () => Promise<T>): Promise<T> {
    const turn = queue.then(work, work);
    queue = turn.catch(() => undefined);
    return turn;
  }

  const handlers: Handlers = {
    'bench.view': () => bench.view(),
    'bench.open': ({ path }) => inTurn(() => bench.open(path)),
    'bench.new': () => inTurn(() => bench.create()),
    'bench.change': ({ change, gesture }) => inTurn(() => bench.change(change, gesture)),
    'bench.undo': () => inTurn(() => bench.step('undo')),
    'bench.redo': () => inTurn(() => bench.step('redo')),
    'bench.save': ({ path }) => inTurn(() => bench.save(path)),
    'bench.revert': () => inTurn(() => bench.revert()),
    'source.preview': ({ source }) => sourcePreview(bench.session, source),
    'quantity.values': ({ ids }) => ({
      version: bench.session.version,
      values: Object.fromEntries(ids.map((id) => [id, bench.session.prepared.quantities.column(id)?.values])),
    }),
    'plate.density': (ask) => plateDensity(bench.session, ask) ?? unknownQuantity(`${ask.x} or ${ask.y}`),
    'cut.histogram': ({ cut, parameter, bins }) => cutHistogram(bench.session, cut, parameter, bins),
    'roster.rows': (ask) => rosterRows(bench.session, ask),
    'object.card': ({ object }) => objectCard(bench.session, object),
    'files.list': ({ folder }) => listFolder(folder ?? bench.folder),
    'edition.freeze': ({ folder }) => inTurn(() => bench.freeze(folder, freeze)),
    'work.stop': () => ({ stopped: bench.stop() }),
  };
  return {
    async handle(name, params) {
      return handlers[name](params);
    },
    listen(heard) {
      listeners.add(heard);
      return () => listeners.delete(heard);
    },
    close: () => inTurn(() => bench.close()),
  };
}

function unknownQuantity(found: string): never {
  throw new ProblemError([{ code: 'unknown-quantity', severity: 'error', found }]);
}
