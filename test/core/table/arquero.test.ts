import { expect, test } from 'vitest';
import { equalWords } from '../../../core/table/arquero';

test('empty lists have no words in common', () => {
  expect([...equalWords([], [])]).toEqual([]);
  expect([...equalWords(['a'], [])]).toEqual([]);
  expect([...equalWords([], ['a'])]).toEqual([]);
});

test('the empty word equals nothing, not even itself', () => {
  expect([...equalWords(['', 'a'], ['', 'b'])]).toEqual([]);
});

test('every pair of places with one word is found', () => {
  const pairs = [...equalWords(['a', 'b', 'a'], ['b', 'a', 'c'])];
  expect(new Set(pairs.map(String))).toEqual(new Set(['0,1', '1,0', '2,1']));
});

test('words that JavaScript objects have a meaning for are words like others', () => {
  const words = ['__proto__', 'constructor', 'toString', 'null', 'undefined', '0'];
  expect([...equalWords(words, [...words].reverse())].map(([left, right]) => left + right)).toEqual(words.map(() => 5));
});
