import changes from '#data/law/changes.json' with { type: 'json' };
import instruments from '#data/law/instruments.json' with { type: 'json' };
import release from '#data/law/release.json' with { type: 'json' };
import caDuties from '#data/parameters/ca-duties.json' with { type: 'json' };
import caHotlistProhibited from '#data/parameters/ca-hotlist-prohibited.json' with { type: 'json' };
import caHotlistRestricted from '#data/parameters/ca-hotlist-restricted.json' with { type: 'json' };
import caHotlist from '#data/parameters/ca-hotlist.json' with { type: 'json' };
import caConditions from '#data/parameters/ca-product-conditions.json' with { type: 'json' };
import caWarnings from '#data/parameters/ca-product-warnings.json' with { type: 'json' };
import caProhibited from '#data/parameters/ca-prohibited.json' with { type: 'json' };
import canadianNames from '#data/parameters/ca-schedule.json' with { type: 'json' };
import categories from '#data/parameters/categories.json' with { type: 'json' };
import annexII1 from '#data/parameters/eu-annex-ii-0001-0600.json' with { type: 'json' };
import annexII2 from '#data/parameters/eu-annex-ii-0601-1200.json' with { type: 'json' };
import annexII3 from '#data/parameters/eu-annex-ii-1201-1767.json' with { type: 'json' };
import annexIII1 from '#data/parameters/eu-annex-iii-001-100.json' with { type: 'json' };
import annexIIIA from '#data/parameters/eu-annex-iii-101-130.json' with { type: 'json' };
import annexIII2 from '#data/parameters/eu-annex-iii-101-200.json' with { type: 'json' };
import annexIII3 from '#data/parameters/eu-annex-iii-201-300.json' with { type: 'json' };
import annexIIIC from '#data/parameters/eu-annex-iii-251-300.json' with { type: 'json' };
import annexIII4 from '#data/parameters/eu-annex-iii-301-386.json' with { type: 'json' };
import annexIIICommon from '#data/parameters/eu-annex-iii-common.json' with { type: 'json' };
import annexIV from '#data/parameters/eu-annex-iv.json' with { type: 'json' };
import annexV from '#data/parameters/eu-annex-v.json' with { type: 'json' };
import annexVI from '#data/parameters/eu-annex-vi.json' with { type: 'json' };
import formaldehyde from '#data/parameters/formaldehyde-releasers.json' with { type: 'json' };
import allergens from '#data/parameters/fragrance-allergens.json' with { type: 'json' };
import warnings from '#data/parameters/product-warnings.json' with { type: 'json' };
import usDuties from '#data/parameters/us-duties.json' with { type: 'json' };
import ukDuties from '#data/parameters/uk-duties.json' with { type: 'json' };
import ukProhibited2022 from '#data/parameters/uk-prohibited-2022.json' with { type: 'json' };
import ukProhibited2024 from '#data/parameters/uk-prohibited-2024.json' with { type: 'json' };
import ukBht from '#data/parameters/uk-restricted-bht.json' with { type: 'json' };
import ukKojicAcid from '#data/parameters/uk-restricted-kojic-acid.json' with { type: 'json' };
import ukMethylSalicylate from '#data/parameters/uk-restricted-methyl-salicylate.json' with { type: 'json' };
import usColours from '#data/parameters/us-colours.json' with { type: 'json' };
import usProhibited from '#data/parameters/us-prohibited.json' with { type: 'json' };
import usRestricted from '#data/parameters/us-restricted.json' with { type: 'json' };
import wordingAnnexIIIA from '#data/parameters/wording-annex-iii-a.json' with { type: 'json' };
import wordingAnnexIIIB from '#data/parameters/wording-annex-iii-b.json' with { type: 'json' };
import wordingAnnexIIIC from '#data/parameters/wording-annex-iii-c.json' with { type: 'json' };
import wordingAnnexIII from '#data/parameters/wording-annex-iii.json' with { type: 'json' };
import wordingCanada from '#data/parameters/wording-ca.json' with { type: 'json' };
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
  rows: [
    ...[annexII1, annexII2, annexII3, annexIIICommon, annexIII1, annexIIIA, annexIII2, annexIII3, annexIIIC, annexIII4, annexIV, annexV, annexVI],
    ...[usProhibited, usRestricted, caProhibited, caHotlist, caHotlistProhibited, caHotlistRestricted],
    ...[ukProhibited2022, ukProhibited2024, ukBht, ukKojicAcid, ukMethylSalicylate],
  ],
  wording: [...wording, ...wordingAnnexIII, ...wordingAnnexIIIA, ...wordingAnnexIIIB, ...wordingAnnexIIIC, ...wordingCanada],
  warnings: [...warnings, ...caWarnings],
  changes,
  usColours,
  formaldehyde,
  duties: [...ukDuties, ...usDuties, ...caDuties],
  productConditions: caConditions,
  canadianNames,
} as unknown as LawTables;
