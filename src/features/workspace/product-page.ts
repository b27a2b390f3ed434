import { useOutletContext } from 'react-router-dom';
import type { House } from '#shared/contracts/house.contract.ts';
import type { Finding } from '#shared/engine/types.ts';
import type { Market } from '#shared/law/types.ts';
import type { Engine } from './engine.ts';
import type { LiveAssessment } from './use-assessment.ts';
import type { DraftDesk } from './use-draft.ts';
import type { MaterialShelf } from './use-materials.ts';

/** What every tab of a product shares: the draft under the pen, its materials, and what the engine says of it now. */
export interface ProductPage {
  readonly id: string;
  readonly desk: DraftDesk;
  readonly shelf: MaterialShelf;
  readonly house: House;
  readonly engine: Engine;
  readonly live: LiveAssessment;
  readonly asOf: { readonly market: Market; readonly placed: string; readonly available: string };
  readonly today: string;
  readonly isReadOnly: boolean;
  /** The label part may be open to someone who changes nothing else. */
  readonly isLabelLocked: boolean;
  readonly handling: readonly Finding[];
  readonly nameOf: (materialId: string) => string;
  /** The address's search part, so that tabs keep market and days. */
  readonly search: string;
}

/** The page's shared state, for the tabs below it. */
export function useProductPage(): ProductPage {
  return useOutletContext<ProductPage>();
}
