import type { Finding } from '#shared/engine/types.ts';
import { sayDay } from '#src/lib/say.ts';

/** What to do; where a finding has no remedy, what it says. */
export function headOf(finding: Finding): string {
  return (finding.remedy ?? finding.message).replace(/\.$/, '');
}
export function whyOf(finding: Finding): string {
  return finding.remedy ? finding.message : '';
}

/** Its sum in one line. */
export function sumOf(finding: Finding): string {
  return (finding.arithmetic ?? []).map((step) => `${step.step}: ${step.figure}`).join('; ');
}

/** How firmly it is sourced, where that is less than the official text. */
export function SourcingMark({ finding }: { finding: Finding }) {
  if (!finding.sourcing) return null;
  const isMemory = finding.sourcing === 'memory';
  return (
    <span className="tag sourcing" title={isMemory ? 'Not yet read in the official text. Check it before you rely on it.' : 'Read in a secondary source, not in the official text.'}>
      {isMemory ? 'from memory' : 'secondary source'}
    </span>
  );
}

/** Since when, or from when, it binds. */
export function sayEffective(finding: Finding): string {
  if (!finding.effective) return '';
  const { from, to } = finding.effective;
  return to ? `In force from ${sayDay(from)} until ${sayDay(to)}.` : `In force from ${sayDay(from)}.`;
}
