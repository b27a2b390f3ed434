import { writeFileSync } from 'node:fs';
import type { Arguments } from './arguments.ts';
import { checkDocument, readDocument, type Knowledge } from './check.ts';
import { readText, Unusable } from './input.ts';
import type { Io } from './io.ts';

/** `label`: writes the press file, or says what does not fit and writes nothing. @throws Unusable */
export async function writeLabel(given: Arguments & { readonly out: string }, knows: Knowledge, io: Io): Promise<number> {
  const document = readDocument(await readText(given.file, io.stdin), given, knows);
  if (!document.label?.container) throw new Unusable([{ pointer: '/label/container', message: 'A label needs a container with its sizes.' }]);
  const market = given.markets[0] ?? document.label.market ?? document.product.markets[0];
  if (!market) throw new Unusable([{ pointer: '/label/market', message: 'Name the market of the label.' }]);
  const result = checkDocument(document, { ...given, markets: [market] }, knows);
  const { renderLabelPdf } = await import('#server/artwork/render-label.ts');
  const rendered = await renderLabelPdf(document, result, { market });
  if (!('pdf' in rendered)) {
    for (const { message } of rendered.misfits) io.tell(message);
    return 1;
  }
  try {
    writeFileSync(given.out, rendered.pdf);
  } catch (error) {
    throw new Unusable([{ pointer: '', message: `The PDF cannot be written to ${given.out} (${error instanceof Error && 'code' in error ? String(error.code) : 'unknown reason'}).` }]);
  }
  const stops = result.results.flatMap(({ findings }) => findings).filter(({ severity }) => severity === 'stop');
  for (const stop of stops) io.tell(`Stops sale: ${stop.message} (${stop.citation})`);
  return 0;
}
