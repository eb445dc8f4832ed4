import { table } from 'arquero';

/** Places in two lists that hold the same word, `[left, right]` each: an inner join. The empty word equals nothing. */
export function* equalWords(
  left: readonly string[],
  right: readonly string[],
): Generator<readonly [left: number, right: number]> {
  const side = (words: readonly string[], place: string): ReturnType<typeof table> => {
    const places: number[] = [];
    for (let at = 0; at < words.length; at++) if (words[at] !== '') places.push(at);
    const all = places.length === words.length;
    return table({ word: all ? words : places.map((at) => words[at]!), [place]: places });
  };
  const joined = side(left, 'left').join(side(right, 'right'), 'word');
  const [lefts, rights] = [joined.array('left'), joined.array('right')] as [number[], number[]];
  for (let at = 0; at < lefts.length; at++) yield [lefts[at]!, rights[at]!];
}
