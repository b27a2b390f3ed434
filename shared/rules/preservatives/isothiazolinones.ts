import type { Finding, Mixture, Substance } from '#shared/engine/types.ts';
import { foldName } from '#shared/law/fold.ts';
import type { Context } from '../context.ts';

/**
 * Annex V, entries 39 and 57 exclude each other in one product: the mixture of
 * methylchloroisothiazolinone and methylisothiazolinone may not stand beside
 * methylisothiazolinone on its own. Reading: "on its own" is a material that brings the second
 * without the first.
 */
export function judgeIsothiazolinones(context: Context): Finding[] {
  const { market } = context.facts;
  if (market !== 'EU' && market !== 'UK') return [];
  const chloro = find(context.mixture, 'Methylchloroisothiazolinone');
  const plain = chloro && find(context.mixture, 'Methylisothiazolinone');
  if (!chloro || !plain) return [];
  const withChloro = new Set(chloro.sources.map((source) => source.materialId));
  const alone = plain.sources.filter((source) => !withChloro.has(source.materialId));
  if (alone.length === 0) return [];
  const row = context.law.row('eu/annex-v/57');
  return [
    {
      kind: 'not-for-this-use',
      severity: 'stop',
      rule: 'eu/annex-v/39-57',
      subject: plain.name,
      members: [chloro.name, plain.name],
      citation: context.law.citation(row, market).replace('entry 57', 'entries 39 and 57'),
      message: 'The mixture with methylchloroisothiazolinone may not be used beside methylisothiazolinone alone.',
      remedy: 'Keep one of the two preservatives.',
      reading: 'A material that brings methylisothiazolinone without the chloro compound counts as its use alone.',
    },
  ];
}

/** Substances merge under their folded names. */
function find(mixture: Mixture, name: string): Substance | undefined {
  return mixture.find(foldName(name));
}
