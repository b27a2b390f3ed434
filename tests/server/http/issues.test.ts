import { expect, test } from 'vitest';
import { z } from 'zod';
import { plainWords, toIssues } from '#server/http/issues.ts';

const schema = z.strictObject({
  name: z.string().min(1),
  lines: z.array(z.strictObject({ amount: z.union([z.literal(''), z.string().regex(/^\d+$/, 'Write a number.')]), unit: z.enum(['g', '%']) })),
  'a/b': z.int().optional(),
});
function issuesOf(value: unknown) {
  const parsed = schema.safeParse(value, { error: plainWords });
  return parsed.success ? [] : toIssues(parsed.error.issues);
}

test('every fault is told, each at its place', () => {
  expect(issuesOf({ lines: [{ amount: 'x', unit: 'g' }, { amount: '', unit: 'kg', note: 1 }], extra: 1, 'a/b': 'x' })).toEqual([
    { pointer: '/name', message: 'This is missing.' },
    { pointer: '/lines/0/amount', message: 'Write a number.' },
    { pointer: '/lines/1/unit', message: 'Choose one of: g, %.' },
    { pointer: '/lines/1/note', message: 'This field is not known here.' },
    { pointer: '/a~1b', message: 'Give a number here.' },
    { pointer: '/extra', message: 'This field is not known here.' },
  ]);
});

test('a value of another kind is told in plain words', () => {
  expect(issuesOf({ name: 3, lines: 'x' })).toEqual([
    { pointer: '/name', message: 'Give text here.' },
    { pointer: '/lines', message: 'Give a list here.' },
  ]);
  expect(issuesOf(undefined)).toEqual([{ pointer: '', message: 'This is missing.' }]);
  expect(issuesOf({ name: '', lines: [] })).toEqual([{ pointer: '/name', message: 'This cannot be empty.' }]);
});
