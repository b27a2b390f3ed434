import changes from '#data/law/changes.json' with { type: 'json' };
import instruments from '#data/law/instruments.json' with { type: 'json' };
import release from '#data/law/release.json' with { type: 'json' };
import categories from '#data/parameters/categories.json' with { type: 'json' };
import allergens from '#data/parameters/fragrance-allergens.json' with { type: 'json' };
import warnings from '#data/parameters/product-warnings.json' with { type: 'json' };
import usColours from '#data/parameters/us-colours.json' with { type: 'json' };
import wording from '#data/parameters/wording.json' with { type: 'json' };
import type { LawTables } from './tables.types.ts';

/**
 * Every law table of this release, as they stand in data/. One module, so that a client can
 * load them as one chunk of its own. The casts only name the shapes that `openLawBook` checks.
 */
export const lawTables = {
  release,
  instruments,
  categories: categories.categories,
  allergens,
  rows: [],
  wording,
  warnings,
  changes,
  usColours,
} as unknown as LawTables;
