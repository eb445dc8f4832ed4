/**
 * The newer of two values, with every part that equals its counterpart taken from the older: what hangs on a part that
 * stayed the same is then not drawn again. Plain objects, arrays and typed arrays; everything else is compared as it is.
 */
export function shared<T>(older: unknown, newer: T): T {
  if (Object.is(older, newer) || !isObject(older) || !isObject(newer)) return newer;
  if (kindOf(older) !== kindOf(newer)) return newer;
  if (ArrayBuffer.isView(newer)) return sameNumbers(older as never, newer as never) ? (older as T) : newer;
  if (Array.isArray(newer)) {
    const list = newer.map((part, at) => shared((older as unknown as unknown[])[at], part as unknown));
    const same =
      list.length === (older as unknown as unknown[]).length && list.every((part, at) => Object.is(part, older[at]));
    return (same ? older : list) as T;
  }
  const names = Object.keys(newer);
  const parts = Object.fromEntries(names.map((name) => [name, shared(older[name], newer[name])]));
  const same =
    names.length === Object.keys(older).length &&
    names.every((name) => Object.hasOwn(older, name) && Object.is(parts[name], older[name]));
  return (same ? older : parts) as T;
}

function isObject(value: unknown): value is Record<string | number, unknown> {
  return typeof value === 'object' && value !== null;
}

/** Kind of an object by its name, because what crossed a bridge may have prototypes of its own. */
function kindOf(value: object): string {
  return Object.prototype.toString.call(value);
}

function sameNumbers(older: ArrayLike<number>, newer: ArrayLike<number>): boolean {
  if (older.length !== newer.length) return false;
  for (let at = 0; at < newer.length; at++) if (!Object.is(older[at], newer[at])) return false;
  return true;
}
