import { z } from 'zod';

/** The meaning of one column of a source, as decided by the user or accepted from the guess. */
export const columnMeaning = z.strictObject({
  column: z.string().describe('Name of the column in the file'),
  role: z.string().describe('What the column is; see the list of roles'),
  unit: z.string().optional().describe('Unit of the numbers in the file; canonical when left out'),
});
export type ColumnMeaning = z.infer<typeof columnMeaning>;

/** One input file with the meaning of its columns. */
export const sourceSchema = z.strictObject({
  id: z
    .string()
    .regex(/^[a-z][a-z0-9-]*$/)
    .describe('Short name by which the recipe speaks of the source'),
  path: z.string().describe('Path of the file, relative to the folder of the recipe'),
  sha256: z
    .string()
    .regex(/^[0-9a-f]{64}$/)
    .describe('Hash of the bytes of the file when it was last read'),
  title: z.string(),
  citation: z.string().describe('DOI, bibcode or address of the catalogue; empty when there is none'),
  invented: z.boolean().describe('True when the data are made up, as in the demo'),
  missing: z.array(z.string()).describe('Cell texts that mean "missing" in this file, beside the usual ones'),
  columns: z.array(columnMeaning).describe('Columns with a role; every other column is ignored'),
});
export type Source = z.infer<typeof sourceSchema>;

/** How sources become one list of objects. */
export const rosterPolicySchema = z.strictObject({
  matchRadiusArcsec: z.number().positive().describe('Two rows of different sources closer than this are one object'),
  matchNames: z.boolean().describe('Whether equal cleaned names make one object'),
  aliases: z.record(z.string(), z.string()).describe('Other spelling → name to use, before cleaning'),
  priority: z.array(z.string()).describe('Source ids, most trusted first; a value is taken from the first that has it'),
  conflictSigma: z
    .number()
    .positive()
    .describe('Sources that differ by more combined sigma stand in the list of conflicts'),
});
export type RosterPolicy = z.infer<typeof rosterPolicySchema>;
