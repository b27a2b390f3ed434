import express from 'express';
import request from 'supertest';
import { expect, test, vi } from 'vitest';
import { errorMiddleware } from '#server/http/problem.ts';

function answerTo(error: unknown, log = vi.fn()) {
  const app = express();
  app.get('/', () => {
    throw error;
  });
  app.use(errorMiddleware(log));
  return request(app).get('/').then((answer) => ({ status: answer.status, body: answer.body as { code: string; detail: string }, logged: log.mock.calls.length }));
}
const fault = (code: string) => Object.assign(new Error('driver'), { code });

// PostgreSQL manual, appendix A: error codes.
test.each([['53100', /disk of the database is full/], ['53200', /short of memory/], ['53300', /no more connections/], ['57014', /took too long/]])('the database’s %s is said in words, as not available', async (code, words) => {
  for (const error of [fault(code), Object.assign(new Error('wrapped'), { cause: fault(code) })]) {
    const { status, body } = await answerTo(error);
    expect([status, body.code]).toEqual([503, 'unavailable']);
    expect(body.detail).toMatch(words);
  }
});

test('a lost connection is not available, anything unknown is our fault and logged', async () => {
  expect((await answerTo(fault('ECONNREFUSED'))).body.code).toBe('unavailable');
  const unknown = await answerTo(new Error('secret words'));
  expect([unknown.status, unknown.body.code, unknown.logged]).toEqual([500, 'internal', 1]);
  expect(JSON.stringify(unknown.body)).not.toContain('secret');
});
