/** Where a text stops being JSON, or repeats a key. */
export interface JsonFault {
  readonly kind: 'syntax' | 'repeated-key';
  /** 1-based. */
  readonly line: number;
  readonly column: number;
  readonly found: string;
  readonly expected: string;
}

export interface JsonScan {
  readonly fault: JsonFault | undefined;
  /** 1-based line on which the value of each path begins, e.g. `ledger[0].rationale`. */
  readonly lines: ReadonlyMap<string, number>;
}

const STRING = /"(?:[^"\\\u0000-\u001f]|\\(?:["\\/bfnrt]|u[0-9a-fA-F]{4}))*"/y;
const NUMBER = /-?(?:0|[1-9]\d*)(?:\.\d+)?(?:[eE][+-]?\d+)?/y;
const WORD = /true|false|null/y;
const BLANK = /[ \t\r\n]*/y;
const DEEPEST = 200;

class Stop extends Error {
  readonly fault: JsonFault;

  constructor(fault: JsonFault) {
    super(fault.found);
    this.fault = fault;
  }
}

/** Reads a JSON text for its first fault and for the line of every value; builds nothing. */
export function scanJson(text: string): JsonScan {
  const lines = new Map<string, number>();
  try {
    scanAll(text, lines);
    return { fault: undefined, lines };
  } catch (error) {
    if (error instanceof Stop) return { fault: error.fault, lines };
    throw error;
  }
}

/** The path of a member as `scanJson` names it. */
export function jsonPath(path: readonly PropertyKey[]): string {
  return path.reduce<string>((whole, step) => {
    if (typeof step === 'number') return `${whole}[${step}]`;
    return whole === '' ? String(step) : `${whole}.${String(step)}`;
  }, '');
}

function scanAll(text: string, lines: Map<string, number>): void {
  let at = 0;
  let [line, counted] = [1, 0];

  const lineHere = (): number => {
    for (; counted < at; counted++) if (text.charCodeAt(counted) === 10) line++;
    return line;
  };
  const stop = (expected: string, found = shown(text, at), kind: JsonFault['kind'] = 'syntax'): never => {
    throw new Stop({ kind, line: lineHere(), column: at - text.lastIndexOf('\n', at - 1), found, expected });
  };
  const take = (pattern: RegExp): string | undefined => {
    pattern.lastIndex = at;
    const match = pattern.exec(text)?.[0];
    at += match?.length ?? 0;
    return match;
  };
  const mark = (sign: string): boolean => {
    take(BLANK);
    if (text[at] !== sign) return false;
    at++;
    return true;
  };

  const value = (path: string, depth: number): void => {
    take(BLANK);
    lines.set(path, lineHere());
    if (depth > DEEPEST) stop(`at most ${DEEPEST} levels of nesting`);
    if (mark('{')) members(path, depth);
    else if (mark('[')) items(path, depth);
    else if ((take(STRING) ?? take(NUMBER) ?? take(WORD)) === undefined) stop('a value');
  };
  const members = (path: string, depth: number): void => {
    if (mark('}')) return;
    const keys = new Set<string>();
    do {
      take(BLANK);
      const start = at;
      const key = take(STRING) ?? stop('a key in double quotes');
      const name = JSON.parse(key) as string;
      if (keys.has(name)) {
        at = start;
        stop('every key once', `the key ${key} a second time`, 'repeated-key');
      }
      keys.add(name);
      if (!mark(':')) stop('a colon after the key');
      value(jsonPath(path === '' ? [name] : [path, name]), depth + 1);
    } while (mark(','));
    if (!mark('}')) stop('a comma or a closing brace');
  };
  const items = (path: string, depth: number): void => {
    if (mark(']')) return;
    let index = 0;
    do value(`${path}[${index++}]`, depth + 1);
    while (mark(','));
    if (!mark(']')) stop('a comma or a closing bracket');
  };

  value('', 0);
  take(BLANK);
  if (at < text.length) stop('the end of the text');
}

function shown(text: string, at: number): string {
  if (at >= text.length) return 'the end of the text';
  const rest = text.slice(at, at + 20);
  return `"${rest.split('\n', 1)[0]!.trimEnd() || 'a line break'}"`;
}
