import { z } from './zod.ts';

/** What `check` prints and the HTTP API answers: every quantity an exact decimal as text. */
const range = z.object({ min: z.string(), typical: z.string(), max: z.string() });
const source = z.object({ material: z.string(), share: z.string() });
const market = z.enum(['EU', 'UK', 'US', 'CA']);
const certainty = z.enum(['certain', 'possible']);

const entry = z.object({
  name: z.string(),
  inci: z.string(),
  zone: z.enum(['ordered', 'free', 'allergen', 'colourant', 'may-contain']),
  share: range,
  sources: z.array(source),
  certainty: certainty.optional(),
  members: z.array(z.string()).optional(),
});

const allergen = z.object({
  name: z.string(),
  total: range,
  threshold: z.string(),
  disclose: z.boolean(),
  certainty: certainty.optional(),
  sources: z.array(source),
  members: z.array(z.string()),
  citation: z.string(),
});

const finding = z.object({
  kind: z.string(),
  severity: z.enum(['stop', 'decide', 'note']),
  rule: z.string(),
  subject: z.string(),
  members: z.array(z.string()).optional(),
  measured: z.string().optional(),
  measuredRange: range.optional(),
  limit: z.string().optional(),
  unit: z.string().optional(),
  basis: z.string().optional(),
  citation: z.string(),
  effective: z.object({ from: z.string(), to: z.string().optional() }).optional(),
  message: z.string(),
  remedy: z.string().optional(),
  arithmetic: z.array(z.object({ step: z.string(), figure: z.string(), from: z.string().optional() })).optional(),
  needs: z.array(z.string()).optional(),
  suggestions: z.array(z.string()).optional(),
  suspects: z
    .array(z.object({ line: z.int(), written: z.string(), perhaps: z.string(), slip: z.enum(['digits-exchanged', 'point-shifted']) }))
    .optional(),
  certainty: certainty.optional(),
  sourcing: z.enum(['secondary', 'memory']).optional(),
  reading: z.string().optional(),
});

const wording = z.object({
  text: z.string(),
  lang: z.string(),
  citation: z.string(),
  subject: z.string(),
  certainty: certainty.optional(),
  place: z.enum(['principal-panel', 'label']).optional(),
  isOfficialText: z.boolean().optional(),
  rule: z.string(),
});

const marketResult = z.object({
  market,
  placedOnMarket: z.string(),
  availableOn: z.string(),
  exposure: z.enum(['leave-on', 'rinse-off']),
  totalMass: z.string(),
  declaration: z.object({ heading: z.string(), text: z.string(), entries: z.array(entry) }),
  allergens: z.array(allergen),
  findings: z.array(finding),
  requiredWording: z.array(wording),
  /** Conditions of the law that nothing entered can decide. */
  notChecked: z.array(z.string()).optional(),
  headroom: z.array(z.object({ line: z.int(), max: z.string().nullable(), limitedBy: z.string().nullable() })),
});

export const resultDocumentSchema = z.object({
  document: z.literal('result/1'),
  dataRelease: z.string(),
  results: z.array(marketResult),
});
export type ResultDocument = z.infer<typeof resultDocumentSchema>;
export type MarketResult = z.infer<typeof marketResult>;
