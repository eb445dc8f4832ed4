import { table } from 'arquero';

/** Places in two lists that hold the same word, `[left, right]` each: an inner join. The empty word equals nothing. */
export function equalWords(left: readonly string[], right: readonly string[]): [number, number][] {
  const side = (words: readonly string[], place: string): ReturnType<typeof table> => {
    const places = words.map((_, at) => at).filter((at) => words[at] !== '');
    return table({ word: places.map((at) => words[at]!), [place]: places });
  };
  const joined = side(left, 'left').join(side(right, 'right'), 'word');
  const [lefts, rights] = [joined.array('left'), joined.array('right')] as [number[], number[]];
  return Array.from(lefts, (place, at) => [place, rights[at]!]);
}
