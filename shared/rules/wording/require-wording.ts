import type { Finding, RequiredWording } from '#shared/engine/types.ts';
import { essence } from '#shared/law/essence.ts';
import type { Market, Sourcing } from '#shared/law/types.ts';
import type { Context } from '../context.ts';
import { ruleId, subjectOf } from '../substances/present.ts';
import type { Outcome } from '../outcome.ts';

/** A text that is due, from whatever rule. */
export interface DueWording {
  readonly wordingId: string;
  readonly rule: string;
  readonly subject: string;
  readonly citation: string;
  readonly certainty: 'certain' | 'possible';
  readonly needs: readonly string[];
  readonly sourcing?: Sourcing;
  readonly reading?: string;
  readonly from?: { readonly placed?: string; readonly available: string };
}

/** The texts that rows on substances want, one for each text and subject. */
export function wordingOf(outcomes: readonly Outcome[], context: Context): DueWording[] {
  const due = new Map<string, DueWording>();
  for (const outcome of outcomes) {
    if (outcome.type !== 'wording') continue;
    const known = due.get(outcome.wordingId!);
    const isDueEitherWay = known !== undefined && isOnlyPurposeOpen(known) && isOnlyPurposeOpen(outcome) && known.rule !== ruleId(outcome);
    if (known && !isDueEitherWay && (known.certainty === 'certain' || outcome.certainty === 'possible')) continue;
    const sourcing = context.law.sourcing(outcome.row, context.facts.market);
    due.set(outcome.wordingId!, {
      wordingId: outcome.wordingId!,
      rule: ruleId(outcome),
      subject: subjectOf(outcome),
      citation: context.law.citation(outcome.row, context.facts.market),
      certainty: isDueEitherWay ? 'certain' : outcome.certainty,
      needs: isDueEitherWay ? [] : outcome.needs,
      ...(sourcing === 'official' ? {} : { sourcing }),
      ...(outcome.provision.reading ? { reading: outcome.provision.reading } : {}),
      ...(outcome.from ? { from: outcome.from } : {}),
    });
  }
  return [...due.values()];
}

/** Open only because the purpose is not stated: two rows that want the same text for either purpose settle it. */
function isOnlyPurposeOpen(one: Pick<DueWording, 'certainty' | 'needs'>): boolean {
  return one.certainty === 'possible' && one.needs.length === 1 && one.needs[0] === 'purpose';
}

/** Languages in which a market wants its texts. */
const LANGUAGES: Readonly<Record<Market, readonly string[]>> = { EU: [], UK: ['en'], US: ['en'], CA: ['en', 'fr'] };

/** Each due text in the languages of the market and of the label. */
export function presentWording(due: readonly DueWording[], context: Context): RequiredWording[] {
  const { market } = context.facts;
  const asked = market === 'EU' ? (context.document.label?.languages ?? []) : [];
  return due.flatMap((one) => {
    const languages = market === 'EU' ? new Set([...context.law.wordingLanguages(one.wordingId), ...asked]) : new Set(LANGUAGES[market]);
    return [...languages].map((lang) => {
      const wording = context.law.wording(one.wordingId, lang);
      return {
        text: wording.text,
        lang,
        citation: one.citation,
        subject: one.subject,
        certainty: one.certainty,
        ...(wording.place ? { place: wording.place } : {}),
        isOfficialText: wording.isOfficialText,
        rule: one.rule,
      };
    });
  });
}

/** A `wording-required` for each due text, and a `wording-missing` where the label's own texts lack it. */
export function judgeWordings(due: readonly DueWording[], context: Context): Finding[] {
  const findings: Finding[] = [];
  for (const one of due) {
    const { text: english, isPointer } = context.law.wording(one.wordingId, 'en');
    const must = isPointer ? 'must carry words that are not held here' : 'must say';
    const common = { rule: one.rule, citation: one.citation, ...(one.sourcing && one.sourcing !== 'official' ? { sourcing: one.sourcing } : {}), ...(one.reading ? { reading: one.reading } : {}) };
    const isOpen = one.certainty === 'possible';
    findings.push({
      ...common,
      kind: 'wording-required',
      severity: isOpen && one.needs.length > 0 ? 'decide' : 'note',
      subject: one.subject,
      certainty: one.certainty,
      message: isOpen ? `It cannot be told yet whether the label ${must}: ${english}` : `The label ${must}: ${english}`,
      remedy: isOpen && one.needs.length > 0 ? `Answer what is open: ${one.needs.join(', ')}.` : 'Print these words on container and packaging.',
      ...(isOpen && one.needs.length > 0 ? { needs: one.needs } : {}),
    });
    if (!isOpen && !isPointer && isMissing(one.wordingId, context)) {
      findings.push({ ...common, kind: 'wording-missing', severity: 'stop', subject: 'warnings', members: [one.subject], message: `The label's warnings do not say: ${english}`, remedy: 'Add these words to the warnings.' });
    }
  }
  return findings;
}

/** True where the document gives particulars, and no text of theirs holds the words in any language held. */
export function isMissing(wordingId: string, context: Context): boolean {
  const particulars = context.document.product.particulars;
  if (!particulars) return false;
  const printed = [...particulars.warnings.map((one) => one.text), particulars.directions ?? '', particulars.function ?? ''];
  const whole = essence(printed.join(' '));
  const languages = context.law.wordingLanguages(wordingId);
  if (languages.some((lang) => isSaid(context.law.wording(wordingId, lang).text, whole))) return false;
  // A text in a language whose official wording is not held cannot be compared here.
  return !particulars.warnings.some((one) => one.lang !== undefined && !languages.includes(one.lang));
}

function isSaid(text: string, whole: string): boolean {
  return whole.includes(essence(text)) || text.split(/[.:;—]\s+/).every((sentence) => whole.includes(essence(sentence)));
}
