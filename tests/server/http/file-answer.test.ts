import { expect, test } from 'vitest';
import { attachment, safeFileName } from '#server/http/file-answer.ts';

test.each([
  ['../../etc/passwd', 'passwd'],
  ['C:\\papers\\sheet.pdf', 'sheet.pdf'],
  ['a\r\nSet-Cookie: x=1.pdf', 'aSet-Cookie x=1.pdf'],
  ['sheet.pdf\u0000.exe', 'sheet.pdf.exe'],
  ['\u202egnp.exe', 'gnp.exe'],
  ['...hidden', 'hidden'],
  ['', 'file'],
  ['///', 'file'],
  ['a   b.pdf', 'a b.pdf'],
])('%j is kept as %j', (raw, kept) => {
  expect(safeFileName(raw)).toBe(kept);
});

test('a name of 4 KB is cut to 120 characters and keeps its ending', () => {
  const name = safeFileName(`${'ä'.repeat(4096)}.pdf`);
  expect(Array.from(name)).toHaveLength(120);
  expect(name.endsWith('ä.pdf')).toBe(true);
});

// RFC 6266 with the extended value of RFC 8187.
test('a name leaves encoded, in plain letters beside it', () => {
  expect(attachment('Körper "Öl" 50%.pdf')).toBe(`attachment; filename="Korper Ol 50_.pdf"; filename*=UTF-8''K%C3%B6rper%20%C3%96l%2050%25.pdf`);
  expect(attachment("L'eau (1).pdf")).toBe(`attachment; filename="L'eau (1).pdf"; filename*=UTF-8''L%27eau%20%281%29.pdf`);
  expect(attachment('日本')).toBe(`attachment; filename="file"; filename*=UTF-8''%E6%97%A5%E6%9C%AC`);
});

test('no name can break the header line', () => {
  for (let code = 0; code < 0x3000; code += 1) expect(attachment(`a${String.fromCharCode(code)}b`)).toMatch(/^[\x20-\x7e]+$/);
});
