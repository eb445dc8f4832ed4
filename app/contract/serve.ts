import { type Problem, ProblemError } from '../../core/table/problem';
import { problemText } from '../../core/table/wording';
import type { Packet } from './link';
import type { EventName, Events, RequestName, Requests, WordedProblem } from './messages';

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
  /** Takes whatever came from the window; false when it was no question. Never throws. */
  take(packet: unknown): boolean;
  leave(): void;
}

/** Seats a window at an engine; `bug` hears of failures that are not the input's fault. */
export function seatWindow(engine: Served, send: (packet: Packet) => void, bug: (error: unknown) => void): WindowSeat {
  const say = (packet: Packet): void => {
    try {
      send(packet);
    } catch (error) {
      bug(error);
    }
  };
  const refuse = (id: number, problems: readonly WordedProblem[]): void => say({ type: 'refusal', id, problems });
  const leave = engine.listen((name, data) => say({ type: 'event', name, data }));
  return {
    take(packet) {
      if (!isQuestion(packet)) return false;
      const { id, name, params } = packet;
      if (!Object.hasOwn(NAMES, name) || typeof params !== 'object' || params === null) {
        refuse(id, worded([{ code: 'unknown-option', severity: 'error', found: `the request ${name}` }]));
        return true;
      }
      engine.handle(name, params as never).then(
        (result) => say({ type: 'answer', id, result }),
        (error: unknown) => {
          if (!(error instanceof ProblemError)) bug(error);
          refuse(id, worded(error instanceof ProblemError ? error.problems : [faultOf(error)]));
        },
      );
      return true;
    },
    leave,
  };
}

type Question = Extract<Packet, { type: 'ask' }>;

function isQuestion(packet: unknown): packet is Question {
  if (typeof packet !== 'object' || packet === null) return false;
  const { type, id, name } = packet as Partial<Question>;
  return type === 'ask' && Number.isSafeInteger(id) && typeof name === 'string';
}

function worded(problems: readonly Problem[]): WordedProblem[] {
  return problems.map((problem) => ({ ...problem, text: problemText(problem) }));
}

function faultOf(error: unknown): Problem {
  const found = (error instanceof Error ? error.message : String(error)).split('\n')[0]!;
  return { code: 'program-fault', severity: 'error', found };
}
