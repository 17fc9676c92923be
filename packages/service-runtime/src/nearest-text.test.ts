import { expect, test } from 'vitest';
import { editCount, nearestText } from './nearest-text.ts';

// The textbook example of edit distance (from memory): kitten, sitten, sittin, sitting.
test('counts the three edits from kitten to sitting', () => {
  expect(editCount('kitten', 'sitting')).toBe(3);
  expect(editCount('sitting', 'kitten')).toBe(3);
});

test('counts a whole text against nothing, and nothing against itself', () => {
  expect(editCount('abc', '')).toBe(3);
  expect(editCount('', 'abc')).toBe(3);
  expect(editCount('abc', 'abc')).toBe(0);
});

test('names nothing when nothing is near', () => {
  expect(nearestText('abcdef', ['uvwxyz'])).toBeUndefined();
  expect(nearestText('abcdef', ['abcdxx', 'abcdex'])).toBe('abcdex');
});
