import { expect, test } from 'vitest';
import { safeNext } from '#server/auth/safe-next.ts';

/** Shapes from the public advice on unvalidated redirects, spelt out; A-07 asks for 40. */
const HOSTILE: readonly unknown[] = [
  'https://elsewhere.example', 'http://elsewhere.example/', 'HTTPS://elsewhere.example', 'https:elsewhere.example', 'https:/elsewhere.example',
  '//elsewhere.example', '///elsewhere.example', '////elsewhere.example', '/\\elsewhere.example', '\\/elsewhere.example', '\\\\elsewhere.example', '/\\/elsewhere.example',
  '/%2f/elsewhere.example', '/%2felsewhere.example', '%2f%2felsewhere.example', '/%5celsewhere.example', '/%252f%252felsewhere.example',
  '/./elsewhere/../..//elsewhere.example', '/..//elsewhere.example', '/.//elsewhere.example', '/%2e%2e//elsewhere.example', '/%2e%2e/api/session', '/a/../../b',
  'javascript:alert(1)', ' javascript:alert(1)', 'JaVaScRiPt:alert(1)', 'data:text/html,x', 'vbscript:x', 'blob:https://elsewhere.example/x',
  '/products\r\nSet-Cookie: a=b', '/products%0d%0aSet-Cookie:a=b', '/\t/elsewhere.example', '/\n/elsewhere.example', '/products\u0000', ' /products', '/products with blank',
  'http://colophon.example@elsewhere.example', '/@elsewhere.example/', '/x@elsewhere.example', 'user:word@elsewhere.example',
  '/。elsewhere.example', '/／elsewhere.example', '', 'products', '?next=/', '#top', '/auth/sign-in', '/AUTH/callback', '/api/products', `/${'a'.repeat(600)}`,
  undefined, null, 7, ['/products'], { toString: () => '/products' },
];

test('there are at least 40 hostile addresses to try', () => {
  expect(HOSTILE.length).toBeGreaterThanOrEqual(40);
});

test.each(HOSTILE.map((value) => [JSON.stringify(value) ?? String(value), value]))('A-07 %s leads to the start page', (_shown, value) => {
  expect(safeNext(value)).toBe('/');
});

test.each(['/', '/products', '/products/8f2e6c40/label?market=EU&on=2026-12-01#verdicts', '/materials?find=avena%20sativa', '/dictionary/aqua-(water)'])('%s is a page of ours', (page) => {
  expect(safeNext(page)).toBe(page);
});
