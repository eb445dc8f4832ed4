import { describe, expect, it } from 'vitest';
import { objectsWith } from './objects';

/** Asks for keys of one shelf and says which of them had to be made. */
function madeOf(asked: readonly string[]): string[] {
  const objects = objectsWith({ x: [1] });
  const made: string[] = [];
  for (const key of asked) {
    const got = objects.memo('angles', key, () => {
      made.push(key);
      return key;
    });
    expect(got).toBe(key);
  }
  return made;
}

describe('the memory for costly columns', () => {
  it('makes a thing once', () => {
    expect(madeOf(['a', 'b', 'a', 'b'])).toEqual(['a', 'b']);
  });

  it('forgets what was not asked for longest, so that dragging a pole does not fill the memory', () => {
    const poles = Array.from({ length: 50 }, (_, at) => `pole ${at}`);
    expect(madeOf([...poles, 'pole 49', 'pole 46', 'pole 0'])).toEqual([...poles, 'pole 0']);
    expect(madeOf(['a', 'b', 'c', 'd', 'a', 'e', 'a', 'b'])).toEqual(['a', 'b', 'c', 'd', 'e', 'b']);
  });

  it('does not push out what stands on another shelf, and remembers that there is nothing', () => {
    const objects = objectsWith({ x: [1] });
    const rows = objects.memo('rows', '', () => ({}));
    let made = 0;
    for (let at = 0; at < 20; at++) {
      objects.memo('angles', String(at), () => undefined);
      objects.memo('none', '', () => {
        made++;
        return undefined;
      });
    }
    expect(objects.memo('rows', '', () => ({}))).toBe(rows);
    expect(made).toBe(1);
  });
});
