import type { core } from 'zod';
import type { Problem } from '../table/problem';
import { jsonPath } from './jsonscan';
import { knownKeys, member } from './schema';

type Issue = core.$ZodIssue;

const TYPES: Readonly<Record<string, string>> = {
  string: 'text',
  number: 'a number',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
  tuple: 'a list',
};

/** What a text must look like, by the key it stands under. */
const FORMS: Readonly<Record<string, string>> = {
  sha256: '64 hexadecimal digits (0-9, a-f)',
  id: 'an id of small letters, digits and hyphens',
};

/** The findings of the schema as problems: where in the document, what was found, what was expected, what to do. */
export function recipeProblems(
  issues: readonly Issue[],
  document: unknown,
  fileName: string,
  lines: ReadonlyMap<string, number>,
): Problem[] {
  return issues.flatMap((issue) => {
    const about = (path: readonly PropertyKey[], found: string, expected: string, remedy?: string): Problem => ({
      code: 'recipe-invalid',
      severity: 'error',
      where: `${fileName}, ${jsonPath(path) || 'top level'}`,
      line: lines.get(jsonPath(path)) ?? lines.get(jsonPath(path.slice(0, -1))),
      found,
      expected,
      remedy,
    });
    if (issue.code === 'unrecognized_keys')
      return issue.keys.map((key) => unknownKey(about, issue.path, key, document));
    return [about(issue.path, shownValue(issue.path.reduce(member, document)), expectedText(issue))];
  });
}

function unknownKey(
  about: (path: readonly PropertyKey[], found: string, expected: string, remedy?: string) => Problem,
  path: readonly PropertyKey[],
  key: string,
  document: unknown,
): Problem {
  const known = knownKeys(path, document).join(', ');
  const remedy =
    'Correct its spelling or take it out; a newer program may also have written it. The file was not changed.';
  return about([...path, key], `the unknown key "${key}"`, `one of: ${known}`, remedy);
}

function expectedText(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_type':
      return TYPES[issue.expected] ?? issue.expected;
    case 'invalid_value':
      return choice(issue.values.map((value) => JSON.stringify(value)));
    case 'invalid_union':
      return choice(('options' in issue ? (issue.options as unknown[]) : []).map((value) => JSON.stringify(value)));
    case 'invalid_format':
      return FORMS[String(issue.path.at(-1))] ?? `text of the form ${issue.format}`;
    case 'too_small':
      return bound(issue.origin, Number(issue.minimum), 'at least', issue.inclusive ? '≥' : '>');
    case 'too_big':
      return bound(issue.origin, Number(issue.maximum), 'at most', issue.inclusive ? '≤' : '<');
    default:
      return issue.message;
  }
}

function bound(origin: string, limit: number, words: string, sign: string): string {
  if (origin === 'string') return limit === 1 ? 'some text' : `${words} ${limit} characters`;
  if (origin === 'array') return `${words} ${limit} entries`;
  return `a number ${sign} ${limit}`;
}

function choice(options: readonly string[]): string {
  return options.length === 1 ? options[0]! : `one of ${options.join(', ')}`;
}

function shownValue(value: unknown): string {
  if (value === undefined) return 'nothing';
  if (Array.isArray(value)) return `a list of ${value.length}`;
  if (typeof value === 'object' && value !== null) return 'an object';
  const text = JSON.stringify(value);
  return text.length > 60 ? `${text.slice(0, 60)}…` : text;
}
