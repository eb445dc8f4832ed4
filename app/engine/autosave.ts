import { rm } from 'node:fs/promises';
import { z } from 'zod';
import { recipeSchema } from '../../core/edition/recipe';
import { readText, writeWhole } from './files';
import type { History } from './history';

const stepSchema = z.object({ recipe: recipeSchema, label: z.string() });
const documentSchema = z.object({
  halosieve: z.literal('bench'),
  version: z.literal(1),
  /** SHA-256 of the recipe file that the work began from; undefined for a bench without a file. */
  base: z.string().optional(),
  past: z.array(stepSchema),
  recipe: recipeSchema,
  future: z.array(stepSchema),
});

/** Unsaved work of an earlier run. */
export interface Autosaved {
  readonly base: string | undefined;
  readonly history: History;
}

/** Keeps the newest history of a bench on disk: at most one write under way, and the newest state wins. */
export interface Autosave {
  keep(history: History, base: string | undefined): void;
  /** Waits until the newest state is on disk. Rejects when the last write failed. */
  settled(): Promise<void>;
  forget(): Promise<void>;
}

/** See Autosave; `failed` hears of writes that the disk refuses. */
export function autosave(path: string, failed: (error: unknown) => void): Autosave {
  let next: string | undefined;
  let running: Promise<void> | undefined;
  async function run(): Promise<void> {
    while (next !== undefined) {
      const text = next;
      next = undefined;
      await writeWhole(path, text);
    }
  }
  return {
    keep({ past, recipe, future }, base) {
      next = JSON.stringify({ halosieve: 'bench', version: 1, base, past, recipe, future });
      running ??= run()
        .catch(failed)
        .finally(() => (running = undefined));
    },
    settled: () => running ?? Promise.resolve(),
    async forget() {
      next = undefined;
      await running;
      await rm(path, { force: true });
    },
  };
}

/** The work that stands in an autosave file; undefined when there is none that can be read. */
export async function readAutosave(path: string): Promise<Autosaved | undefined> {
  try {
    const parsed = documentSchema.parse(JSON.parse(await readText(path)));
    const { base, past, recipe, future } = parsed;
    return { base, history: { past, recipe, future } };
  } catch {
    return undefined;
  }
}
