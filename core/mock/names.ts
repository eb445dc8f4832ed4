import type { Dice } from './dice';

/** Invented discoverers after whom the invented clusters are called. */
const DISCOVERERS = [
  'Tarnow',
  'Quillby',
  'Ostrowel',
  'Hesperin',
  'Marlock',
  'Venn-Ashdown',
  'Brévane',
  'Ibarrola',
] as const;

/** A name that no other object of the list has, e.g. "Tarnow 7". */
export function clusterName(index: number): string {
  return `${DISCOVERERS[index % DISCOVERERS.length]!} ${Math.floor(index / DISCOVERERS.length) + 1}`;
}

/** Another survey's spelling of the same name. */
export function respelled(name: string, dice: Dice): string {
  const [who, number] = [name.slice(0, name.lastIndexOf(' ')), name.slice(name.lastIndexOf(' ') + 1)];
  const plain = who.normalize('NFKD').replace(/\p{Mn}/gu, '');
  return dice.pick([
    `${plain.toUpperCase()}-${number.padStart(2, '0')}`,
    `${plain}${number}`,
    `${who}  ${number}`,
    `${plain.toUpperCase()} ${number.padStart(3, '0')}`,
  ]);
}
