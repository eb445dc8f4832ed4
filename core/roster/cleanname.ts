/**
 * The key under which spellings of one name meet: no case, diacritics, blanks or punctuation, no leading zeros of
 * numbers. A plus or minus between digits stays, because it tells positions apart. '' stays ''.
 */
export function cleanName(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/\p{Mn}/gu, '')
    .toLowerCase()
    .replace(/[−–]/g, '-')
    .replace(/(\d)\s*([+-])\s*(?=\d{3,})/g, '$1$2')
    .replace(/[^\p{L}\p{N}+-]/gu, '')
    .replace(/(?<!\d)[+-]|[+-](?!\d{3})/g, '')
    .replace(/(?<![\d.])0+(?=\d)/g, '');
}
