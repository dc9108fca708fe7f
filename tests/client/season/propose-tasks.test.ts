import { expect, test } from 'vitest';
import { proposeTasks } from '#src/features/problem/components/propose-tasks.ts';

test('propose tasks, when the statement asks questions: takes them and leaves the description', () => {
  const statement =
    'A tall can with a hole in its side is filled and leaned by 1.5 degrees. How far can its jet reach? At which lean?';

  expect(proposeTasks(statement)).toEqual(['How far can its jet reach?', 'At which lean?']);
});

test('propose tasks, when it asks with verbs: takes the sentences that begin with one', () => {
  const statement =
    'A jar rolls down a slope and may stop. Predict where it stops.\nExplain what decides it.';

  expect(proposeTasks(statement)).toEqual(['Predict where it stops.', 'Explain what decides it.']);
});

test('propose tasks, when it asks nothing in so many words: takes the last sentence', () => {
  expect(proposeTasks('A bubble rises in oil. It is stubborn.')).toEqual(['It is stubborn.']);
});

test('propose tasks, when there is no text: proposes nothing', () => {
  expect(proposeTasks('  \n ')).toEqual([]);
});

test('propose tasks, when the text is very long: proposes at most twelve', () => {
  expect(proposeTasks('Why does it move? '.repeat(40))).toHaveLength(12);
});
