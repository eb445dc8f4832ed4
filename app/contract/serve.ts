import { type Problem, ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import type { Packet } from './link';
import type { EventName, Events, RequestName, Requests } from './messages';

/** The engine as a door sees it. */
export interface Served {
  handle<Name extends RequestName>(name: Name, params: Requests[Name]['params']): Promise<Requests[Name]['result']>;
  listen(heard: <Name extends EventName>(name: Name, data: Events[Name]) => void): () => void;
}

/** Every request by name; a name that is not here is refused before it reaches the engine. */
const NAMES: Readonly<Record<RequestName, true>> = {
  'bench.view': true,
  'bench.open': true,
  'bench.new': true,
  'bench.change': true,
  'bench.undo': true,
  'bench.redo': true,
  'bench.save': true,
  'bench.revert': true,
  'source.preview': true,
  'quantity.values': true,
  'plate.density': true,
  'cut.histogram': true,
  'roster.rows': true,
  'object.card': true,
  'files.list': true,
  'edition.freeze': true,
  'work.stop': true,
};

/** One window's side of an engine: takes its packets, sends it answers and events. */
export interface WindowSeat {
  take(packet: Packet): void;
  leave(): void;
}

/** Seats a window at an engine; `bug` hears of failures that are not the input's fault. */
export function seatWindow(engine: Served, send: (packet: Packet) => void, bug: (error: unknown) => void): WindowSeat {
  const leave = engine.listen((name, data) => send({ type: 'event', name, data }));
  return {
    take(packet) {
      if (packet.type !== 'ask') return;
      const { id, name, params } = packet;
      if (!Object.hasOwn(NAMES, name)) {
        send({
          type: 'refusal',
          id,
          problems: worded([{ code: 'unknown-option', severity: 'error', found: `the request ${name}` }]),
        });
        return;
      }
      engine.handle(name, params as never).then(
        (result) => send({ type: 'answer', id, result }),
        (error: unknown) => {
          if (!(error instanceof ProblemError)) bug(error);
          send({
            type: 'refusal',
            id,
            problems: error instanceof ProblemError ? worded(error.problems) : [internal(error)],
          });
        },
      );
    },
    leave,
  };
}

function worded(problems: readonly Problem[]): (Problem & { text: string })[] {
  return problems.map((problem) => ({ ...problem, text: problemText(problem) }));
}

function internal(error: unknown): Problem & { text: string } {
  const first = (error instanceof Error ? error.message : String(error)).split('\n')[0]!;
  return {
    code: 'cancelled',
    severity: 'error',
    text: `The program failed: ${first}. Your work is kept; please report this.`,
  };
}
