import type { z } from 'zod';
import type { Issue } from './app-error.ts';
import { pointerStep } from './text-hygiene.ts';

/** Plain words for faults whose schema gives none of its own. */
export function plainWords(issue: z.core.$ZodRawIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      return issue.input === undefined ? 'This is missing.' : `Give ${EXPECTED[issue.expected] ?? 'another kind of value'} here.`;
    case 'unrecognized_keys':
      return 'This field is not known here.';
    case 'too_big':
      return issue.origin === 'string' ? `Use at most ${String(issue.maximum)} characters.` : `At most ${String(issue.maximum)} here.`;
    case 'too_small':
      return issue.origin === 'string' ? 'This cannot be empty.' : `At least ${String(issue.minimum)} here.`;
    case 'invalid_value':
      return `Choose one of: ${issue.values.map(String).join(', ')}.`;
    case 'invalid_format':
      return 'This is not written in the expected form.';
    default:
      return 'This is not one of the forms taken here.';
  }
}

const EXPECTED: Readonly<Record<string, string>> = {
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'yes or no',
  array: 'a list',
  object: 'a group of fields',
  record: 'a group of fields',
};

/** Every fault of a zod refusal by JSON Pointer, in document order. */
export function toIssues(issues: readonly z.core.$ZodIssue[], base: readonly PropertyKey[] = []): Issue[] {
  return issues.flatMap((issue) => {
    const path = [...base, ...issue.path];
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({ pointer: toPointer([...path, key]), message: issue.message }));
    }
    if (issue.code === 'invalid_union') {
      const branch = nearestBranch(issue.errors);
      if (branch) return toIssues(branch, path);
    }
    return [{ pointer: toPointer(path), message: issue.message }];
  });
}

/** The alternative that came closest: the one whose first fault is not about its very kind. */
function nearestBranch(branches: readonly (readonly z.core.$ZodIssue[])[]): readonly z.core.$ZodIssue[] | undefined {
  const isAboutKind = (issue: z.core.$ZodIssue | undefined) =>
    issue === undefined || (issue.path.length === 0 && (issue.code === 'invalid_value' || issue.code === 'invalid_type'));
  return branches.find((branch) => branch.length > 0 && !isAboutKind(branch[0])) ?? branches.find((branch) => branch.length > 0);
}

function toPointer(path: readonly PropertyKey[]): string {
  return path.map(pointerStep).join('');
}
