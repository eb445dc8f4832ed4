/** A fixed-length set of row numbers, 32 rows a word. Bits past `size` are always zero. */
export class Bitset {
  readonly size: number;
  readonly words: Uint32Array;

  constructor(size: number, words?: Uint32Array) {
    this.size = size;
    this.words = words ?? new Uint32Array((size + 31) >>> 5);
  }

  static full(size: number): Bitset {
    const set = new Bitset(size);
    set.words.fill(0xffffffff);
    return set.trim();
  }

  /** Rows for which the test holds. */
  static where(size: number, test: (row: number) => boolean): Bitset {
    const set = new Bitset(size);
    for (let row = 0; row < size; row++) if (test(row)) set.add(row);
    return set;
  }

  add(row: number): void {
    this.words[row >>> 5]! |= 1 << (row & 31);
  }

  has(row: number): boolean {
    return ((this.words[row >>> 5]! >>> (row & 31)) & 1) === 1;
  }

  count(): number {
    const { words } = this;
    let total = 0;
    for (let at = 0; at < words.length; at++) total += popcount(words[at]!);
    return total;
  }

  and(other: Bitset): Bitset {
    const [words, a, b] = this.#beside(other);
    for (let at = 0; at < words.length; at++) words[at] = a[at]! & b[at]!;
    return new Bitset(this.size, words);
  }

  or(other: Bitset): Bitset {
    const [words, a, b] = this.#beside(other);
    for (let at = 0; at < words.length; at++) words[at] = a[at]! | b[at]!;
    return new Bitset(this.size, words);
  }

  /** Rows in this set and not in the other. */
  without(other: Bitset): Bitset {
    const [words, a, b] = this.#beside(other);
    for (let at = 0; at < words.length; at++) words[at] = a[at]! & ~b[at]!;
    return new Bitset(this.size, words);
  }

  not(): Bitset {
    const words = new Uint32Array(this.words.length);
    for (let at = 0; at < words.length; at++) words[at] = ~this.words[at]!;
    return new Bitset(this.size, words).trim();
  }

  equals(other: Bitset): boolean {
    return this.size === other.size && this.words.every((word, at) => word === other.words[at]);
  }

  /** Row numbers in ascending order. */
  rows(): Int32Array {
    const rows = new Int32Array(this.count());
    let at = 0;
    this.words.forEach((bits, word) => {
      for (let left = bits; left !== 0; left &= left - 1) {
        rows[at++] = (word << 5) + (31 - Math.clz32(left & -left));
      }
    });
    return rows;
  }

  /** Room for a result, and the words of both sets; one loop an operation, because a shared one would not be inlined. */
  #beside(other: Bitset): [Uint32Array, Uint32Array, Uint32Array] {
    if (other.size !== this.size) throw new RangeError('bitsets of different size');
    return [new Uint32Array(this.words.length), this.words, other.words];
  }

  private trim(): this {
    const spare = this.size & 31;
    if (spare !== 0) this.words[this.words.length - 1]! &= (1 << spare) - 1;
    return this;
  }
}

/** How many bits of a word are set; the word may be signed. */
export function popcount(word: number): number {
  let v = word - ((word >>> 1) & 0x55555555);
  v = (v & 0x33333333) + ((v >>> 2) & 0x33333333);
  return Math.imul((v + (v >>> 4)) & 0x0f0f0f0f, 0x01010101) >>> 24;
}
