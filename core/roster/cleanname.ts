/**
 * The key under which spellings of one name meet: no case, diacritics, blanks or punctuation, no leading zeros of
 * numbers. A plus or minus before three digits or more stays with its zeros, because names made of coordinates differ
 * by it. Cleaning a second time changes nothing. '' stays '', and so does a name of punctuation alone.
 */
export function cleanName(name: string): string {
  return name
    .normalize('NFKD')
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[−–]/g, '-')
    .replace(/[^\p{L}\p{N}+-]/gu, '')
    .replace(/(?<!\d)[+-]|[+-](?!\d{3})/g, '')
    .replace(/(?<![\d+-])0+(?=\d)/g, '');
}
