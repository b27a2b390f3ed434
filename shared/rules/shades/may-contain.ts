import type { Finding } from '#shared/engine/types.ts';
import type { Market, Sourcing } from '#shared/law/types.ts';
import type { Context } from '../context.ts';

/** Where a market lets the colourants of other shades follow the list, and for which products. */
const PLACES: Readonly<Record<Market, { readonly citation: string; readonly products: string; readonly sourcing?: Sourcing }>> = {
  EU: { citation: 'Regulation (EC) No 1223/2009, Article 19(1)(g)', products: 'decorative cosmetics sold in several shades' },
  UK: { citation: 'Regulation (EC) No 1223/2009 as assimilated in Great Britain, Article 19(1)(g)', products: 'decorative cosmetics sold in several shades', sourcing: 'secondary' },
  US: { citation: '21 CFR 701.3(g)', products: 'eye and facial make-up and nail enamel of a shade line', sourcing: 'secondary' },
  CA: { citation: 'Cosmetic Regulations, C.R.C., c. 869, s. 21.2(2)', products: 'make-up, nail polish and nail enamel' },
};

/** "May contain" is for make-up and nail colour; elsewhere it is a question to settle. */
export function judgeMayContain(context: Context): Finding[] {
  const { mayContain } = context.document.product;
  if (mayContain.length === 0 || context.facts.category.decorative) return [];
  const place = PLACES[context.facts.market];
  return [
    {
      kind: 'may-contain-misplaced',
      severity: 'decide',
      rule: `${context.facts.market.toLowerCase()}/may-contain`,
      subject: mayContain[0]!.inci,
      members: mayContain.map((shade) => shade.inci),
      citation: place.citation,
      message: `Colourants of other shades may follow the list only for ${place.products}.`,
      remedy: 'List the colourants that this product holds, and no others.',
      certainty: 'certain',
      ...(place.sourcing ? { sourcing: place.sourcing as 'secondary' } : {}),
    },
  ];
}
