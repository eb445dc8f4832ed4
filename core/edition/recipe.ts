import { z } from 'zod';
import { cutSchema } from '../cuts/cut';
import { rosterPolicySchema, sourceSchema } from '../roster/sourcemap';

/** Version of the recipe document that this program writes. */
export const RECIPE_VERSION = 1;

/** One plot of two quantities. */
export const plateSchema = z.strictObject({
  id: z.string(),
  x: z.string().describe('Quantity id on the horizontal axis'),
  y: z.string().describe('Quantity id on the vertical axis'),
});

/** The document of all decisions. */
export const recipeSchema = z.strictObject({
  halosieve: z.literal('recipe'),
  version: z.literal(RECIPE_VERSION),
  title: z.string().min(1),
  author: z.string(),
  note: z.string().describe('What the sample is for'),
  sources: z.array(sourceSchema),
  roster: rosterPolicySchema,
  frame: z.string().describe('Name of the solar frame, e.g. G18'),
  extinction: z.strictObject({
    rv: z.number().positive().describe('R_V, total to selective extinction'),
    recalibration: z.number().positive().describe('Factor on every E(B-V) value; 1 leaves the column as it is'),
  }),
  borderlineSigma: z
    .number()
    .min(0)
    .describe(
      'An object is borderline when moving its values by this many sigma could change its verdict; 0 switches it off',
    ),
  ledger: z.array(cutSchema),
  plates: z.array(plateSchema),
});

export type Plate = z.infer<typeof plateSchema>;
export type Recipe = z.infer<typeof recipeSchema>;
