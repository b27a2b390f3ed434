import { afterAll, beforeAll, expect, test } from 'vitest';
import type { House } from '#shared/contracts/house.contract.ts';
import type { ProductWorkspace } from '#shared/contracts/products.contract.ts';
import type { ResultDocument } from '#shared/contracts/result-document.ts';
import { presentResult } from '#shared/engine/present-result.ts';
import { toDocument } from '#shared/product/to-document.ts';
import { MAUD } from '#server/local/demo-people.ts';
import { createEngine } from '#src/features/workspace/engine.ts';
import { openTestApp, TODAY, type Client, type TestApp } from '#tests/support/app.ts';

/** The browser judges with what the workspace sends it; the server judges with the whole dictionary. Both must say the same. */
let app: TestApp;
let maud: Client;

beforeAll(async () => {
  app = await openTestApp();
  maud = await app.as(MAUD);
}, 120_000);
afterAll(() => app.close());

test('the browser finds for every product of the house what the server finds', async () => {
  const engine = createEngine();
  const house = (await maud.get('/house')).body as House;
  const { items } = (await maud.get('/products')).body as { items: { id: string; name: string }[] };
  expect(items.length).toBeGreaterThanOrEqual(6);
  for (const { id, name } of items) {
    const workspace = (await maud.get(`/products/${id}`)).body as ProductWorkspace;
    const { draft } = workspace.product;
    const server = (await maud.get(`/products/${id}/result`)).body as ResultDocument;
    const judge = engine.withNames({ entries: workspace.entries, unknown: workspace.unknown, release: workspace.dictionaryRelease });
    const browser = presentResult(
      judge(toDocument(draft, workspace.materials, house), { markets: draft.markets, placed: draft.placedOnMarket ?? TODAY, available: draft.availableOn ?? TODAY, today: TODAY }),
    );
    for (const [index, result] of browser.results.entries()) {
      const told = server.results[index]!;
      expect(result.declaration, `${name} in ${result.market}`).toEqual(told.declaration);
      // Handling limits of process steps are the product's own and are added by each side.
      expect(result.findings, `${name} in ${result.market}`).toEqual(told.findings.filter((finding) => finding.kind !== 'handling-limit'));
    }
  }
}, 60_000);
