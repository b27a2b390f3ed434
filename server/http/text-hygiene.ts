import type { Issue } from './app-error.ts';

/** Nesting no honest document needs; deeper input could exhaust the stack of whoever walks it. */
const DEEPEST = 40;

// Line feed, tab and carriage return stay; NUL and lone surrogates cannot be stored, the
// others (C0, C1, direction overrides and isolates) could make a label read as it is not.
const HIDDEN = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]/;

const LONE_SURROGATE = /\p{Surrogate}/u;

const HIDDEN_MESSAGE = 'Take out the hidden characters: type the text again or paste it as plain text.';

/** Escapes one step of a JSON Pointer (RFC 6901). */
export function pointerStep(step: string | number | symbol): string {
  return `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`;
}

interface Visit {
  readonly holder: Record<string, unknown>;
  readonly key: string;
  readonly pointer: string;
  readonly depth: number;
}

/**
 * Brings every text of a parsed JSON value to Unicode NFC in place and lists texts and keys
 * that hold hidden or unstorable characters, and nesting beyond reason.
 */
export function cleanTexts(value: unknown): { readonly value: unknown; readonly issues: readonly Issue[] } {
  const root: Record<string, unknown> = { value };
  const issues: Issue[] = [];
  const stack: Visit[] = [{ holder: root, key: 'value', pointer: '', depth: 0 }];
  for (let visit = stack.pop(); visit && issues.length < 100; visit = stack.pop()) {
    const found = visit.holder[visit.key];
    if (typeof found === 'string') cleanText(visit, found, issues);
    else if (typeof found === 'object' && found !== null) pushParts(visit, found, stack, issues);
  }
  return { value: root.value, issues };
}

function cleanText(visit: Visit, text: string, issues: Issue[]): void {
  if (isHidden(text)) issues.push({ pointer: visit.pointer, message: HIDDEN_MESSAGE });
  else visit.holder[visit.key] = text.normalize('NFC');
}

function pushParts(visit: Visit, found: object, stack: Visit[], issues: Issue[]): void {
  if (visit.depth >= DEEPEST) {
    issues.push({ pointer: visit.pointer, message: 'This is nested too deeply to be read.' });
    return;
  }
  const holder = found as Record<string, unknown>;
  for (const key of Object.keys(holder)) {
    const pointer = visit.pointer + pointerStep(key);
    if (key === '__proto__' || isHidden(key)) issues.push({ pointer: visit.pointer, message: 'This holds a field name that is not known here.' });
    else stack.push({ holder, key, pointer, depth: visit.depth + 1 });
  }
}

function isHidden(text: string): boolean {
  return HIDDEN.test(text) || LONE_SURROGATE.test(text);
}
