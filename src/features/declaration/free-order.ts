import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Market } from '#shared/law/types.ts';

/** `keys` with one of them at another place. */
export function placeKey(keys: readonly string[], key: string, place: number): string[] {
  const from = keys.indexOf(key);
  if (from < 0) return [...keys];
  return keys.toSpliced(from, 1).toSpliced(Math.max(0, Math.min(place, keys.length - 1)), 0, key);
}

/** Keeps a chosen order of the free part for one market. */
export function chooseOrder(market: Market, order: readonly string[]) {
  return (draft: ProductDraft): ProductDraft => ({
    ...draft,
    declaration: { ...draft.declaration, freeOrder: { ...draft.declaration.freeOrder, [market]: [...order] } },
  });
}

/** Forgets the chosen order of one market: descending share again. */
export function resetOrder(market: Market) {
  return (draft: ProductDraft): ProductDraft => {
    const { [market]: gone, ...rest } = draft.declaration.freeOrder;
    return gone === undefined ? draft : { ...draft, declaration: { ...draft.declaration, freeOrder: rest } };
  };
}

/** Shortest lawful names, or joined ones such as `Water (Aqua)`. */
export function setJoinedNames(joinedNames: boolean) {
  return (draft: ProductDraft): ProductDraft => ({ ...draft, declaration: { ...draft.declaration, joinedNames } });
}
