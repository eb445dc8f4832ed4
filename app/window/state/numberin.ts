/** The number in a text as people write it, with a minus sign or a comma for the point; undefined for anything else. */
export function numberIn(text: string): number | undefined {
  const plain = text.trim().replace('−', '-').replace(',', '.');
  const number = Number(plain);
  return plain === '' || !Number.isFinite(number) ? undefined : number;
}
