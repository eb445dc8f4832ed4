import { basename, dirname, join, relative, resolve } from 'node:path';
import type { Recipe } from '../../core/edition/recipe';
import { emptyRecipe, parseRecipe, recipeText } from '../../core/edition/recipefile';
import type { Source } from '../../core/roster/sourcemap';
import { fail } from '../../core/table/problem';
import type { BenchView, Change, FreezeResult } from '../contract/messages';
import { type Autosave, autosave, readAutosave } from './autosave';
import { applyChange, freeId } from './changes';
import { guessedMeanings } from './columnview';
import type { EngineHost, Heard } from './host';
import { readText, sha256, writeWhole } from './files';
import { advance, begin, type History, redo, undo } from './history';
import { type BenchLock, lockBench } from './lock';
import { openSource, type Prepared, type PrepareOptions } from './pipeline';
import { type Session, sessionOf } from './session';
import { benchKey } from './statefolder';
import { benchView } from './views';

type Freeze = (prepared: Prepared, folder: string, options: { now: string; version: string }) => Promise<FreezeResult>;

/** The open working session: recipe, data, undo history, autosave, lock. */
export class Bench {
  readonly #host: EngineHost;
  readonly #tell: Heard;
  #history: History = begin(emptyRecipe('New sample'));
  #session: Session | undefined;
  #recipePath: string | undefined;
  /** Hash of the recipe file as it stands on disk. */
  #base: string | undefined;
  #restored = false;
  #revision = 0;
  #lastEdition: string | undefined;
  #lock: BenchLock | undefined;
  #autosave: Autosave | undefined;
  #working: AbortController | undefined;

  constructor(host: EngineHost, tell: Heard) {
    this.#host = host;
    this.#tell = tell;
  }

  /** The data of the bench; refused before one is open. */
  get session(): Session {
    return this.#session ?? fail('file-missing', { found: 'no bench is open' });
  }

  /** Folder that paths of the recipe are relative to. */
  get folder(): string {
    return this.#recipePath === undefined ? process.cwd() : dirname(this.#recipePath);
  }

  /** Opens a recipe, or a data file as the first source of a new bench. */
  async open(path: string): Promise<BenchView> {
    const full = resolve(path);
    if (!full.endsWith('.json')) {
      await this.create();
      return this.change({ type: 'add-source', path: full });
    }
    const text = await readText(full);
    const recipe = parseRecipe(text, basename(full));
    await this.#begin(full, recipe, sha256(text));
    return this.#show();
  }

  async create(): Promise<BenchView> {
    await this.#begin(undefined, emptyRecipe('New sample'), undefined);
    return this.#show();
  }

  /** Applies a change; further ones of the same gesture join its step. */
  async change(change: Change, gesture?: string): Promise<BenchView> {
    const { recipe: before } = this.#history;
    const source = await this.#sourceOf(change, before);
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
    const target =
      path === undefined ? this.#recipePath : resolve(path.endsWith('.json') ? path : `${path}.halosieve.json`);
    if (target === undefined)
      fail('file-missing', { found: 'the bench has no recipe file yet', remedy: 'Choose where to save it.' });
    const recipe = this.#rebased(target);
    const text = recipeText(recipe);
    await writeWhole(target, text);
    const history = { ...this.#history, recipe };
    if (target !== this.#recipePath) await this.#take(target);
    this.#base = sha256(text);
    await this.#become(history);
    this.#show();
    return { path: target };
  }

  /** Throws unsaved work away and goes back to the recipe's file. */
  async revert(): Promise<BenchView> {
    await this.#autosave?.forget();
    const path = this.#recipePath;
    return path === undefined ? this.create() : this.open(path);
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
      recipePath: this.#recipePath,
      saved: this.#base !== undefined && sha256(recipeText(this.#history.recipe)) === this.#base,
      restored: this.#restored,
      undo: past.map(({ label }) => label).reverse(),
      redo: future.map(({ label }) => label).reverse(),
      lastEdition: this.#lastEdition,
    });
  }

  async #begin(path: string | undefined, recipe: Recipe, base: string | undefined): Promise<void> {
    const lock = path === this.#recipePath ? this.#lock : undefined;
    const taken = lock ?? lockBench(this.#statePath(path, 'lock'), path);
    const kept = await readAutosave(this.#statePath(path, 'bench.json'));
    const usable =
      kept !== undefined && path !== undefined && kept.history.past.length + kept.history.future.length > 0;
    const history = usable ? kept.history : begin(recipe);
    try {
      const session = await this.#read(history.recipe, path === undefined ? process.cwd() : dirname(path), undefined);
      await this.#autosave?.settled();
      if (this.#lock !== taken) this.#lock?.release();
      this.#session = session;
    } catch (error) {
      if (taken !== this.#lock) taken.release();
      throw error;
    }
    [this.#lock, this.#recipePath, this.#base, this.#history] = [taken, path, base, history];
    this.#restored = usable && recipeText(history.recipe) !== recipeText(recipe);
    this.#lastEdition = undefined;
    this.#autosave = this.#newAutosave(path);
  }

  /** Moves lock and autosave to another recipe file. */
  async #take(path: string): Promise<void> {
    const lock = lockBench(this.#statePath(path, 'lock'), path);
    await this.#autosave?.forget();
    this.#lock?.release();
    this.#lock = lock;
    this.#recipePath = path;
    this.#autosave = this.#newAutosave(path);
  }

  async #become(history: History): Promise<void> {
    this.#session = await this.#read(history.recipe, this.folder, this.#session);
    this.#history = history;
    this.#autosave?.keep(history, this.#base);
  }

  async #read(recipe: Recipe, folder: string, before: Session | undefined): Promise<Session> {
    return this.#stoppable((options) => sessionOf(recipe, folder, before, options));
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

  /** Reads the file of a change that brings a source. */
  async #sourceOf(change: Change, recipe: Recipe): Promise<Source | undefined> {
    if (change.type === 'accept-source') {
      const source =
        recipe.sources.find(({ id }) => id === change.source) ?? fail('unknown-quantity', { found: change.source });
      const file = await this.#stoppable((options) => openSource(source, this.folder, options));
      return { ...source, sha256: file.sha256 };
    }
    if (change.type !== 'add-source') return undefined;
    const full = resolve(this.folder, change.path);
    const bare = {
      id: freeId(sourceId(full), recipe.sources),
      path: this.#pathFor(full),
      sha256: '0'.repeat(64),
      title: basename(full),
    };
    const source: Source = { ...bare, citation: '', invented: false, missing: [], columns: [] };
    const { file, sha256: hash } = await this.#stoppable((options) => openSource(source, this.folder, options));
    const invented = file.comments.some((line) => /\binvented data\b/i.test(line));
    return { ...source, invented, sha256: hash, columns: guessedMeanings(file.table) };
  }

  /** A path as a recipe writes it: relative to the recipe when there is one, with forward slashes. */
  #pathFor(full: string): string {
    return this.#recipePath === undefined ? full : portable(relative(this.folder, full));
  }

  /** The recipe with source paths relative to where it will stand. */
  #rebased(target: string): Recipe {
    const { recipe } = this.#history;
    if (target === this.#recipePath) return recipe;
    const sources = recipe.sources.map((source) => ({
      ...source,
      path: portable(relative(dirname(target), resolve(this.folder, source.path))),
    }));
    return { ...recipe, sources };
  }

  #newAutosave(path: string | undefined): Autosave {
    return autosave(this.#statePath(path, 'bench.json'), () =>
      this.#tell('progress', {
        label: 'Unsaved work cannot be kept: the state folder cannot be written',
        share: undefined,
      }),
    );
  }

  #statePath(path: string | undefined, ending: string): string {
    const key = path === undefined ? `${benchKey(undefined)}-${process.pid}` : benchKey(path);
    return join(this.#host.stateFolder, `${key}.${ending}`);
  }

  #show(): BenchView {
    this.#revision++;
    const view = this.view();
    this.#tell('bench', view);
    return view;
  }
}

function portable(path: string): string {
  return path.replaceAll('\\', '/');
}

function sourceId(path: string): string {
  const stem = basename(path)
    .replace(/\..*$/, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '');
  return /^[a-z]/.test(stem) ? stem : `source-${stem}`.replace(/-$/, '');
}
