import { readList as readIngredients } from '#shared/reading/read-list.ts';
import type { Arguments } from './arguments.ts';
import type { Knowledge } from './check.ts';
import { readText, Unusable } from './input.ts';
import type { Io } from './io.ts';

/** `read` of a pasted ingredient list: 1 where something stops sale. @throws Unusable */
export async function readList(given: Arguments, { law, dictionary, today }: Knowledge, io: Io): Promise<number> {
  const market = given.markets[0];
  const category = given.category === undefined ? undefined : law.categories.get(given.category);
  const faults = [
    ...(market ? [] : ['--market is missing: name the market whose rules the list is read by.']),
    ...(given.markets.length > 1 ? ['A list is read for one market at a time.'] : []),
    ...(given.category === undefined ? ['--category is missing: name the kind of product.'] : category ? [] : [`--category: no product category is called "${given.category}".`]),
  ];
  if (!market || !category || faults.length > 0) throw new Unusable(faults.map((message) => ({ pointer: '', message })));
  const text = await readText(given.file, io.stdin);
  const read = readIngredients(text, { market, category, law, dictionary, placedOnMarket: given.placed ?? today, availableOn: given.available ?? today });
  if ('mistake' in read) throw new Unusable([{ pointer: '', message: read.mistake }]);
  for (const finding of read.document.findings) if (finding.kind === 'date-not-covered') io.tell(finding.message);
  await io.write(`${JSON.stringify(read.document, null, 1)}\n`);
  return read.document.findings.some(({ severity }) => severity === 'stop') ? 1 : 0;
}
