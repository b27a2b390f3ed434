import { z } from 'zod';
import { formulaDocumentSchema } from '#shared/contracts/formula-document.ts';
import { readingDocumentSchema } from '#shared/contracts/reading-document.ts';
import { resultDocumentSchema } from '#shared/contracts/result-document.ts';
import { Unusable } from './input.ts';
import type { Io } from './io.ts';

const SCHEMAS = { formula: formulaDocumentSchema, result: resultDocumentSchema, reading: readingDocumentSchema };

/** `schema`: the JSON Schema of a document. @throws Unusable for another name */
export async function writeSchema(name: string, io: Io): Promise<number> {
  if (!Object.hasOwn(SCHEMAS, name)) {
    throw new Unusable([{ pointer: '', message: `There is no schema "${name}". Choose formula, result or reading.` }]);
  }
  const schema = SCHEMAS[name as keyof typeof SCHEMAS];
  await io.write(`${JSON.stringify(z.toJSONSchema(schema, { io: 'input' }), null, 2)}\n`);
  return 0;
}
