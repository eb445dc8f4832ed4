import type { Problem, ProblemCode } from './problem';

interface Wording {
  /** What is wrong, without the place. */
  readonly says: (problem: Problem) => string;
  readonly remedy: string;
}

const or = (text: string | undefined, otherwise: string): string => text ?? otherwise;
const times = (count: number | undefined): string => (count === undefined || count === 1 ? '' : ` (${count} times)`);

const WORDINGS: Readonly<Record<ProblemCode, Wording>> = {
  'empty-file': {
    says: (p) => `the file has no rows: found ${or(p.found, 'nothing')}`,
    remedy: 'Choose a file with a header line and at least one row.',
  },
  'not-text': {
    says: (p) => `this is not a text table but ${or(p.found, 'binary data')}`,
    remedy: 'Export the table as CSV or TSV in UTF-8 and open that.',
  },
  'not-a-table': {
    says: (p) => `no table can be read here: found ${or(p.found, 'one column')}`,
    remedy:
      'The first line that is no comment must name at least two columns, separated by comma, tab, semicolon or bar.',
  },
  'unclosed-quote': {
    says: () => 'a quoted cell opens here and is never closed',
    remedy: 'Close the quote, or double a quote that belongs to the text.',
  },
  'ragged-row': {
    says: (p) =>
      `the row has ${or(p.found, 'another number of cells')} where the header has ${or(p.expected, 'others')}`,
    remedy: 'The row is in quarantine. Mend it in the file and open the file again.',
  },
  'comment-rows': {
    says: (p) => `${p.count ?? 1} line(s) among the rows begin with # and were taken as comments`,
    remedy: 'If they are data, quote their first cell.',
  },
  'duplicate-column': {
    says: () => 'two columns have this name',
    remedy: 'Rename one of them in the file.',
  },
  'unnamed-column': {
    says: (p) => `${or(p.found, 'a column')} has no name and is called ${or(p.expected, 'by its place')}`,
    remedy: 'Name it in the file if it matters.',
  },
  'unknown-column': {
    says: () => 'the recipe speaks of this column, but the file does not have it',
    remedy: 'Choose another column for the role, or give the file that the recipe was made with.',
  },
  'unknown-quantity': {
    says: (p) => `there is no quantity or role called ${or(p.found, 'so')}`,
    remedy: 'Choose one from the list.',
  },
  'unknown-unit': {
    says: (p) => `the unit "${or(p.found, '')}" is not understood`,
    remedy: 'Choose a unit from the list; the column is left out until then.',
  },
  'wrong-unit': {
    says: (p) => `the unit "${or(p.found, '')}" is not one of ${or(p.expected, 'the right kind')}`,
    remedy: 'Choose a unit of that kind or another role; the column is left out until then.',
  },
  'words-among-numbers': {
    says: (p) => `${p.count ?? 1} cell(s) of a column of numbers hold words and count as missing: ${or(p.found, '')}`,
    remedy: 'Name the word as a spelling of "missing" in the source, or mend the cells.',
  },
  'out-of-range': {
    says: (p) => `found ${or(p.found, 'a value')} where only ${or(p.expected, 'other values')} can be${times(p.count)}`,
    remedy: 'The values count as missing. Check the unit and the role, or name the value as a spelling of "missing".',
  },
  'negative-error': {
    says: (p) => `an error is negative: ${or(p.found, '')}${times(p.count)}`,
    remedy: 'The errors count as missing. Name the value as a spelling of "missing" if it is one.',
  },
  'role-taken': {
    says: (p) => `the role ${or(p.found, '')} is already given to column ${or(p.expected, '')}`,
    remedy: 'Give each role to one column; this one is ignored.',
  },
  'no-position': {
    says: (p) => `the row has no readable position: found ${or(p.found, 'nothing')}`,
    remedy: 'The row is in quarantine. An object needs right ascension and declination, or Galactic l and b.',
  },
  'duplicate-name': {
    says: (p) =>
      `${or(p.found, 'an object')} stands a second time; the row on ${or(p.expected, 'an earlier line')} is used`,
    remedy: 'Remove one of the two rows, or give them different names.',
  },
  'ambiguous-match': {
    says: (p) => `${or(p.found, 'a row')} has several neighbours within the match radius; the nearest was taken`,
    remedy: 'Lower the match radius, or name the pair by an alias.',
  },
  'far-namesake': {
    says: (p) =>
      `${or(p.found, 'an object')} has the same name in two sources but stands ${or(p.expected, 'far')} apart`,
    remedy: 'They were taken as one object. Rename one in its source if they are two.',
  },
  'parallax-distance': {
    says: () => 'distances come from parallaxes here; the inverse of a noisy parallax is a biased distance',
    remedy: 'Only parallaxes of at least 5 times their error are used. Give a distance or a modulus if there is one.',
  },
  'placeholder-velocity': {
    says: (p) => `${p.count ?? 1} velocities look like a placeholder (0 with an error of 100 km/s or more)`,
    remedy: 'Name 0 as a spelling of "missing" in that source if they are.',
  },
  'too-large': {
    says: (p) => `the file is too large for this: ${or(p.found, '')}`,
    remedy: 'Split it, or keep only the columns that are needed.',
  },
  'file-missing': {
    says: () => 'there is no such file',
    remedy: 'Check the path, or point the source to where the file is now.',
  },
  'file-unreadable': {
    says: (p) => `the file cannot be read (${or(p.found, 'unknown reason')})`,
    remedy: 'Check that it is a file and that you may read it.',
  },
  'folder-missing': {
    says: (p) => `there is no folder to write it to (${or(p.found, 'it does not exist')})`,
    remedy: 'Make the folder, or choose another one.',
  },
  'folder-read-only': {
    says: (p) => `nothing can be written here (${or(p.found, 'no permission')})`,
    remedy: 'Choose a folder that you may write to.',
  },
  'disk-full': {
    says: () => 'the disk is full; nothing was changed',
    remedy: 'Make room and try again.',
  },
  'source-changed': {
    says: (p) =>
      `the file is not the one that the recipe was made with (sha256 ${or(p.found, '?')}, expected ${or(p.expected, '?')})`,
    remedy: 'Bring the old file back, or accept the new one in its source (the recipe then names its hash).',
  },
  'recipe-not-json': {
    says: (p) => `this is not JSON: ${or(p.found, 'unreadable')}`,
    remedy: 'Choose a .halosieve.json recipe, or mend the file.',
  },
  'recipe-version': {
    says: (p) => `the recipe is of version ${or(p.found, '?')}, and this program reads ${or(p.expected, '?')}`,
    remedy: 'Update the program. The file was not changed.',
  },
  'recipe-invalid': {
    says: (p) => `the recipe does not fit its schema: found ${or(p.found, '?')}, expected ${or(p.expected, '?')}`,
    remedy: 'Mend the recipe; core/edition/recipe.schema.json says what it may hold. The file was not changed.',
  },
  'bench-in-use': {
    says: (p) => `another Halosieve has this bench open (process ${or(p.found, 'unknown')})`,
    remedy: 'Use that window, or close it first.',
  },
  'unsaved-left': {
    says: (p) => `unsaved work of an earlier bench is kept here: ${or(p.found, 'a bench')}`,
    remedy: 'Open this file to go on with it; it stays until the bench is saved or reverted.',
  },
  'recipe-edited': {
    says: () => 'another program edited the recipe since it was opened here; it was not written over',
    remedy: 'Save under another name, or open the file again: it then stands as a step beside your work.',
  },
  'work-beside-edit': {
    says: () => 'another program edited the recipe while unsaved work on it was kept; the edited file is shown',
    remedy: 'Undo brings the unsaved work back and redo the file; saving keeps what is shown then.',
  },
  'rationale-missing': {
    says: (p) => `${or(p.found, 'a cut')} is switched on without a rationale`,
    remedy: 'Write why the cut stands where it stands, or switch it off.',
  },
  'empty-sample': {
    says: () => 'no object is left in the sample',
    remedy: 'Loosen a cut before freezing.',
  },
  'edition-not-found': {
    says: (p) => `this is not an edition: ${or(p.found, 'its documents are missing')}`,
    remedy: 'Give the folder of one edition, e.g. editions/edition-1.',
  },
  'edition-differs': {
    says: (p) => `the edition is not what was frozen: ${or(p.found, '')}`,
    remedy: 'Use an untouched copy, or freeze again.',
  },
  'unknown-option': {
    says: (p) => `${or(p.found, 'an option')} is not understood`,
    remedy: 'See --help.',
  },
  'engine-stopped': {
    says: (p) => `the engine stopped ${or(p.found, 'again and again')} and was not started again`,
    remedy: 'Your work is kept: start Halosieve again. Please report what was asked of it last.',
  },
  'program-fault': {
    says: (p) => `the program failed: ${or(p.found, 'unknown reason')}`,
    remedy: 'Your work is kept. Please report this with what you did last.',
  },
  cancelled: {
    says: () => 'stopped before it was done; nothing was changed',
    remedy: 'Start it again when you like.',
  },
};

/** The problem as a sentence with its place, and what to do about it. */
export function problemText(problem: Problem): string {
  const { says, remedy } = WORDINGS[problem.code];
  const place = [
    problem.where,
    problem.line === undefined ? undefined : `line ${problem.line}`,
    problem.column === undefined ? undefined : `column ${problem.column}`,
  ]
    .filter((part) => part !== undefined)
    .join(', ');
  const sentence = `${says(problem)}.`;
  return `${place === '' ? upper(sentence) : `${place}: ${sentence}`} ${problem.remedy ?? remedy}`;
}

function upper(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
