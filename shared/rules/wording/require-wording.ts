import type { Finding, RequiredWording } from '#shared/engine/types.ts';
import type { Sourcing } from '#shared/law/types.ts';
import type { Context } from '../context.ts';
import { ruleId, subjectOf } from '../substances/present.ts';
import type { Outcome } from '../outcome.ts';
import { labelLanguages, languageName, missingLanguages } from './label-languages.ts';

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

/** Each due text in the languages of the market and of the label. */
export function presentWording(due: readonly DueWording[], context: Context): RequiredWording[] {
  const { market } = context.facts;
  const asked = labelLanguages(market, context.document);
  return due.flatMap((one) => {
    const languages = new Set([...(market === 'EU' ? context.law.wordingLanguages(one.wordingId) : []), ...asked]);
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
    if (isOpen || isPointer) continue;
    const missing = missingLanguages(one.wordingId, context.facts.market, context.document, context.law);
    if (missing.length > 0) findings.push({ ...common, kind: 'wording-missing', severity: 'stop', subject: 'warnings', members: [one.subject], ...sayMissing(one.wordingId, missing, context) });
  }
  return findings;
}

/** What the label does not say, language by language, and what to do about each. */
function sayMissing(wordingId: string, missing: readonly string[], context: Context): { readonly message: string; readonly remedy: string } {
  const { market } = context.facts;
  const held = context.law.wordingLanguages(wordingId);
  const isHeldHere = missing.filter((lang) => held.includes(lang));
  const isElsewhere = missing.filter((lang) => !held.includes(lang));
  const onlyEnglish = missing.length === 1 && missing[0] === 'en' && labelLanguages(market, context.document).length <= 1;
  const texts = isHeldHere.map((lang) => {
    const { text, isOfficialText } = context.law.wording(wordingId, lang);
    return `${onlyEnglish ? '' : `in ${languageName(lang)}: `}${text}${isOfficialText ? '' : ' (check these words against the official text before you print them)'}`;
  });
  const { text: english, citation } = context.law.wording(wordingId, 'en');
  const edition = market === 'EU' ? 'of the Official Journal' : 'of the official text';
  const places = isElsewhere.map((lang) => `in ${languageName(lang)}: the words of ${citation}, as the ${languageName(lang)} edition ${edition} prints them. In English: ${english}`);
  return {
    message: `The label's warnings do not say${onlyEnglish ? ':' : ','} ${[...texts, ...places].join('; ')}`,
    remedy: [
      ...(isHeldHere.length > 0 ? ['Add these words to the warnings.'] : []),
      ...(isElsewhere.length > 0 ? [`Take the official words in ${isElsewhere.map(languageName).join(' and ')} from ${citation} and add them to the warnings, marked with their language.`] : []),
    ].join(' '),
  };
}

/** True where the label lacks the words in a language that it must carry. */
export function isMissing(wordingId: string, context: Context): boolean {
  return missingLanguages(wordingId, context.facts.market, context.document, context.law).length > 0;
}
