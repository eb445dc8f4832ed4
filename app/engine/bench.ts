import { resolve } from 'node:path';
import type { Recipe } from '../../core/edition/recipe';
import { recipeText } from '../../core/edition/recipefile';
import { fail, type Problem } from '../../core/table/problem';
import type { BenchView, Change, FreezeResult } from '../contract/messages';
import { type Autosave, autosave } from './autosave';
import { emptyStart, keptStart, recipeStart, refuseEdited, type Start } from './benchstart';
import { applyChange } from './changes';
import { sha256, writeWhole } from './files';
import { advance, type History, mapRecipes, redo, undo } from './history';
import type { EngineHost, Heard } from './host';
import { leftBenches } from './leftbenches';
import { type BenchLock, lockBench } from './lock';
import type { Prepared, PrepareOptions } from './pipeline';
import { newPlace, type Place, placeOfKept, recipePlace } from './place';
import { type Session, sessionOf } from './session';
import { bringsSource, rebased, sourceOfChange } from './sourceofchange';
import { benchView, worded } from './views';

type Freeze = (prepared: Prepared, folder: string, options: { now: string; version: string }) => Promise<FreezeResult>;

/** The open working session: recipe, data, undo history, autosave, lock. */
export class Bench {
  readonly #host: EngineHost;
  readonly #tell: Heard;
  #history: History = emptyStart().history;
  #session: Session | undefined;
  #place: Place;
  /** Hash of the recipe file as it was read or written last. */
  #base: string | undefined;
  #restored = false;
  #notices: readonly Problem[] = [];
  #revision: number;
  /** The greatest version that a session has had; never given twice, also where one bench follows another. */
  #version: number;
  #lastEdition: string | undefined;
  #lock: BenchLock | undefined;
  #autosave: Autosave | undefined;
  #working: AbortController | undefined;

  constructor(host: EngineHost, tell: Heard) {
    this.#host = host;
    this.#tell = tell;
    this.#place = newPlace(host.stateFolder);
    this.#revision = host.shown?.revision ?? 0;
    this.#version = host.shown?.version ?? 0;
  }

  /** The data of the bench; refused before one is open. */
  get session(): Session {
    return this.#session ?? fail('file-missing', { found: 'no bench is open' });
  }

  /** Folder that paths of the recipe are relative to. */
  get folder(): string {
    return this.#place.folder;
  }

  /** Opens a recipe, a data file as the first source of a new bench, or the kept file of an unsaved bench. */
  async open(path: string): Promise<BenchView> {
    const full = resolve(path);
    const left = placeOfKept(this.#host.stateFolder, full);
    if (left) return this.#begin(left, () => keptStart(left));
    if (full.endsWith('.json')) {
      const place = recipePlace(this.#host.stateFolder, full);
      return this.#begin(place, () => recipeStart(place, full));
    }
    const place = newPlace(this.#host.stateFolder);
    return this.#begin(place, () => this.#catalogueStart(place, full));
  }

  async create(): Promise<BenchView> {
    return this.#begin(newPlace(this.#host.stateFolder), () => Promise.resolve(emptyStart()));
  }

  /** Applies a change; further ones of the same gesture join its step. */
  async change(change: Change, gesture?: string): Promise<BenchView> {
    const { recipe: before } = this.#history;
    const source = bringsSource(change)
      ? await this.#stoppable((options) => sourceOfChange(change, before, this.#place, options))
      : undefined;
    const { roster } = this.session.prepared;
    const nameOf = (key: string): string => roster.names[roster.keys.indexOf(key)] ?? key;
    const { recipe, label } = applyChange(before, change, { now: this.#host.now(), nameOf, source });
    await this.#become(advance(this.#history, recipe, label, gesture));
    return this.#show();
  }

  async step(which: 'undo' | 'redo'): Promise<BenchView> {
    await this.#become(which === 'undo' ? undo(this.#history) : redo(this.#history));
    return this.#show();
  }

  /** Writes the recipe to its file or to another one, which is then its file. */
  async save(path: string | undefined): Promise<{ path: string }> {
    const own = this.#place.recipePath;
    const target = path === undefined ? own : resolve(path.endsWith('.json') ? path : `${path}.halosieve.json`);
    if (target === undefined)
      fail('file-missing', { found: 'the bench has no recipe file yet', remedy: 'Choose where to save it.' });
    if (target === own) {
      const text = recipeText(this.#history.recipe);
      await refuseEdited(target, this.#base, text);
      await writeWhole(target, text);
      this.#base = sha256(text);
    } else await this.#moveTo(recipePlace(this.#host.stateFolder, target), target);
    this.#autosave?.keep(this.#history, this.#base);
    await this.#autosave?.settled();
    this.#notices = this.#notices.filter(({ code }) => code !== 'work-beside-edit');
    this.#show();
    return { path: target };
  }

  /** Throws unsaved work away and goes back to the recipe's file. */
  async revert(): Promise<BenchView> {
    await this.#autosave?.forget();
    const { recipePath } = this.#place;
    return recipePath === undefined ? this.create() : this.open(recipePath);
  }

  /** Writes the next edition; refused while a source is not as the recipe says. */
  async freeze(folder: string | undefined, write: Freeze): Promise<FreezeResult> {
    const { sources, prepared, recipe } = this.session;
    for (const { problems } of sources.values()) {
      const problem = problems.find(({ severity }) => severity === 'error');
      if (problem) fail(problem.code, problem);
    }
    this.#tell('progress', { label: 'Freezing the sample', share: undefined });
    try {
      const result = await write({ ...prepared, recipe }, resolve(this.folder, folder ?? 'editions'), {
        now: this.#host.now(),
        version: this.#host.version,
      });
      this.#lastEdition = result.folder;
      this.#show();
      return result;
    } finally {
      this.#tell('progress', undefined);
    }
  }

  /** Stops reading; what was there before stays. */
  stop(): boolean {
    const running = this.#working !== undefined;
    this.#working?.abort();
    return running;
  }

  async close(): Promise<void> {
    this.stop();
    await this.#autosave?.settled();
    this.#lock?.release();
    this.#lock = undefined;
  }

  view(): BenchView {
    const { past, future } = this.#history;
    return benchView(this.session, {
      revision: this.#revision,
      recipePath: this.#place.recipePath,
      saved: this.#base !== undefined && sha256(recipeText(this.#history.recipe)) === this.#base,
      restored: this.#restored,
      keptIn: this.#place.keptIn,
      notices: this.#notices.map(worded),
      undo: past.map(({ label }) => label).reverse(),
      redo: future.map(({ label }) => label).reverse(),
      lastEdition: this.#lastEdition,
    });
  }

  /** Takes the lock of a place, makes what begins there, and only then leaves the bench that was open. */
  async #begin(place: Place, start: () => Promise<Start>): Promise<BenchView> {
    const same = place.keptIn === this.#place.keptIn ? this.#lock : undefined;
    const lock = same ?? lockBench(place.lock, place.recipePath ?? place.keptIn);
    let notice: Problem | undefined;
    try {
      await this.#autosave?.settled();
      const begun = await start();
      const { history, base, restored } = begun;
      notice = begun.notice;
      this.#session = await this.#read(history.recipe, place.folder, undefined);
      [this.#place, this.#history, this.#base, this.#restored] = [place, history, base, restored];
    } catch (error) {
      if (lock !== this.#lock) lock.release();
      throw error;
    }
    if (lock !== this.#lock) this.#lock?.release();
    this.#lock = lock;
    this.#lastEdition = undefined;
    this.#autosave = this.#newAutosave(place);
    if (this.#history.past.length > 0) this.#autosave.keep(this.#history, this.#base);
    this.#notices = [...(notice ? [notice] : []), ...(await leftBenches(this.#host.stateFolder, place.keptIn))];
    return this.#show();
  }

  async #catalogueStart(place: Place, path: string): Promise<Start> {
    const { history } = emptyStart();
    const change = { type: 'add-source', path } as const;
    const source = await this.#stoppable((options) => sourceOfChange(change, history.recipe, place, options));
    const { recipe, label } = applyChange(history.recipe, change, {
      now: this.#host.now(),
      nameOf: (key) => key,
      source,
    });
    return { history: advance(history, recipe, label), base: undefined, restored: false };
  }

  /** Writes the recipe to another file and moves there with lock, history and autosave; all of it or nothing. */
  async #moveTo(place: Place, path: string): Promise<void> {
    const history = mapRecipes(this.#history, (recipe) => rebased(recipe, this.folder, place.folder));
    const text = recipeText(history.recipe);
    const lock = lockBench(place.lock, path);
    try {
      const session = await this.#read(history.recipe, place.folder, this.#session);
      await writeWhole(path, text);
      this.#session = session;
    } catch (error) {
      lock.release();
      throw error;
    }
    await this.#autosave?.forget();
    this.#lock?.release();
    [this.#place, this.#history, this.#base, this.#lock] = [place, history, sha256(text), lock];
    this.#autosave = this.#newAutosave(place);
  }

  async #become(history: History): Promise<void> {
    this.#session = await this.#read(history.recipe, this.folder, this.#session);
    this.#history = history;
    this.#autosave?.keep(history, this.#base);
  }

  async #read(recipe: Recipe, folder: string, before: Session | undefined): Promise<Session> {
    const version = ++this.#version;
    return this.#stoppable((options) => sessionOf(recipe, folder, before, { ...options, version }));
  }

  async #stoppable<T>(work: (options: PrepareOptions) => Promise<T>): Promise<T> {
    const working = new AbortController();
    this.#working = working;
    try {
      return await work({ signal: working.signal, onProgress: (progress) => this.#tell('progress', progress) });
    } finally {
      this.#working = undefined;
      this.#tell('progress', undefined);
    }
  }

  #newAutosave({ keptIn }: Place): Autosave {
    return autosave(keptIn, () =>
      this.#tell('progress', {
        label: 'Unsaved work cannot be kept: the state folder cannot be written',
        share: undefined,
      }),
    );
  }

  #show(): BenchView {
    this.#revision++;
    const view = this.view();
    this.#tell('bench', view);
    return view;
  }
}
