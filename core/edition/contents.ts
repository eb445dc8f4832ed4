/** Every file of an edition and what it holds, in the order in which they are listed. */
export const EDITION_FILES: readonly { readonly name: string; readonly holds: string }[] = [
  { name: 'sample.csv', holds: 'The sample: one row per object, every quantity with its error and source' },
  { name: 'sample.ecsv', holds: 'The same with units, descriptions and UCDs in the header' },
  {
    name: 'dropped.csv',
    holds: 'Every object that is not in the sample, with the cuts that dropped or could not judge it',
  },
  { name: 'dropped.ecsv', holds: 'The same with units, descriptions and UCDs in the header' },
  {
    name: 'quarantine.csv',
    holds: 'Rows of the sources that are no object rows: unreadable or repeated, with the reason',
  },
  { name: 'recipe.halosieve.json', holds: 'All decisions: sources and roles, frame, ledger of cuts, plates' },
  {
    name: 'edition.json',
    holds: 'Number, time, program, counts, sources, frame, attrition and conflicts, for programs',
  },
  { name: 'README.md', holds: 'What all this is, for someone without the program' },
  { name: 'report.html', holds: 'The whole selection for reading, with figures; opens offline' },
  { name: 'SHA256SUMS', holds: 'Checksums of all other files, for sha256sum -c' },
];
