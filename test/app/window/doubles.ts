import { LostError, RefusedError } from '../../../app/contract/link';
import type { EngineLink } from '../../../app/contract/link';
import type { BenchView, CutView, RequestName } from '../../../app/contract/messages';
import { CUT_KINDS, cutKind } from '../../../core/cuts/kinds';
import { emptyRecipe } from '../../../core/edition/recipefile';

/** A question that the double was asked and has not answered yet. */
export interface Asked {
  readonly name: RequestName;
  readonly params: Record<string, unknown>;
  answer(result: unknown): Promise<void>;
  refuse(text: string): Promise<void>;
}

/** An engine that answers only when the test says so. */
export class DoubleEngine {
  readonly asked: Asked[] = [];
  readonly #listeners = new Map<string, (data: never) => void>();
  #tell: (connected: boolean) => void = () => undefined;
  readonly #lose = new Set<(error: unknown) => void>();
  readonly link: EngineLink = {
    ask: (name, params) =>
      new Promise((resolve, reject) => {
        this.#lose.add(reject);
        const done = async (): Promise<void> => {
          this.#lose.delete(reject);
          await settle();
        };
        this.asked.push({
          name,
          params: params as Record<string, unknown>,
          answer: (result) => (resolve(result as never), done()),
          refuse: (text) => (reject(refusal(text)), done()),
        });
      }),
    listen: (name, heard) => {
      this.#listeners.set(name, heard);
      return () => this.#listeners.delete(name);
    },
    onState: (heard) => {
      this.#tell = heard;
      return () => undefined;
    },
  };

  /** Connects and answers nothing. */
  reach(): void {
    this.#tell(true);
  }

  /** Connects, and answers the window's first question with a view. */
  async connect(view: BenchView): Promise<void> {
    this.reach();
    await this.next('bench.view').answer(view);
  }

  /** Breaks the link: what was asked is lost. */
  async lose(): Promise<void> {
    this.asked.length = 0;
    for (const reject of this.#lose) reject(new LostError('the engine is gone'));
    this.#lose.clear();
    this.#tell(false);
    await settle();
  }

  /** Sends a view that nobody asked for. */
  async show(view: BenchView): Promise<void> {
    this.#listeners.get('bench')?.(view as never);
    await settle();
  }

  /** Takes the oldest open question of a name. */
  next(name: RequestName): Asked {
    const at = this.asked.findIndex((asked) => asked.name === name);
    if (at < 0) throw new Error(`nobody asked for ${name}`);
    return this.asked.splice(at, 1)[0]!;
  }

  /** How many questions of a name are open. */
  open(name: RequestName): number {
    return this.asked.filter((asked) => asked.name === name).length;
  }
}

/** Lets everything happen that waits for nothing but its turn. */
export async function settle(): Promise<void> {
  await new Promise((resolve) => setTimeout(resolve));
}

/** A view of a bench of `objects` objects without sources. */
export function viewOf(objects: number, facts: Partial<BenchView> = {}): BenchView {
  const counts = { objects, sample: objects, kept: objects, borderline: 0, dropped: 0, unjudged: 0 };
  return {
    version: 1,
    revision: 1,
    recipe: emptyRecipe('Trial'),
    recipePath: '/trial.halosieve.json',
    saved: true,
    restored: false,
    keptIn: '/trial.bench.json',
    notices: [],
    invented: false,
    undo: [],
    redo: [],
    sources: [],
    conflicts: [],
    duplicates: [],
    quarantine: [],
    problems: [],
    quantities: [],
    frames: [],
    kinds: CUT_KINDS.map(({ kind, label, purpose, caution, proposals, defaults }) => ({
      kind,
      label,
      purpose,
      caution,
      proposals,
      defaults,
    })),
    cuts: [],
    counts,
    verdicts: new Uint8Array(objects),
    names: Array.from({ length: objects }, (_, row) => `Object ${row}`),
    withoutRationale: [],
    lastEdition: undefined,
    ...facts,
  };
}

/** A cut of a kind with its defaults, as a view shows it. */
export function cutOf(kind: string, set: Partial<CutView['cut']> = {}): CutView {
  const definition = cutKind(kind);
  const cut = {
    id: kind,
    kind,
    on: true,
    missing: 'unjudged',
    rationale: 'Because.',
    evidence: [],
    author: '',
    parameters: definition.defaults,
    ...set,
  } as unknown as CutView['cut'];
  return {
    cut,
    attrition: { describe: `says ${kind}`, inTurn: 1, alone: 2, onlyByIt: 3, unjudged: 4 } as CutView['attrition'],
    limits: definition.limits(cut.parameters),
    lacking: [],
  };
}

function refusal(text: string): RefusedError {
  return new RefusedError([{ code: 'unknown-option', severity: 'error', text }]);
}
