import { useDeferredValue, useMemo, useState } from 'react';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { createMaterial, listMaterials } from '#shared/contracts/materials.contract.ts';
import type { MaterialSummary } from '#shared/contracts/materials.contract.ts';
import { updateProduct } from '#shared/contracts/products.contract.ts';
import type { Product } from '#shared/contracts/products.contract.ts';
import { call } from '#src/lib/api/call.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { AreaField } from '#src/ui/field.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { VerdictWord } from '#src/ui/verdict-mark.tsx';
import { NewProductForm } from './new-product-form.tsx';
import { formulaOf, materialFromName, planPaste } from './paste-plan.ts';
import type { PastePlan } from './paste-plan.ts';
import './products.css';

/** Every material of the house: a paste is matched against all of them. */
async function readAllMaterials(signal: AbortSignal): Promise<MaterialSummary[]> {
  const first = await call(listMaterials, { query: {} }, signal);
  const pages = Math.ceil(first.total / first.pageSize);
  const rest = await Promise.all(Array.from({ length: Math.max(0, pages - 1) }, (_, index) => call(listMaterials, { query: { page: index + 2 } }, signal)));
  return [first, ...rest].flatMap((one) => one.items);
}

/** A product begun from a spreadsheet: what was read stands beside it before anything is created. */
export function StartFromPaste({ onCreated }: { onCreated: (product: Product) => void }) {
  const [text, setText] = useState('');
  const settled = useDeferredValue(text);
  const client = useQueryClient();
  const { data: materials = [] } = useQuery({ queryKey: ['materials', 'every'], queryFn: ({ signal }) => readAllMaterials(signal) });
  const plan = useMemo(() => planPaste(settled, materials), [settled, materials]);
  const [done, setDone] = useState<number | null>(null);
  const [failure, setFailure] = useState<unknown>(null);
  const fill = async (product: Product) => {
    setFailure(null);
    try {
      onCreated(await fillFormula(product, plan, setDone));
    } catch (error) {
      // The product stands already: it is opened with what could be written, and says so there.
      setFailure(error);
    } finally {
      setDone(null);
      await client.invalidateQueries({ queryKey: ['materials'] });
    }
  };
  return (
    <div className="paste-start">
      <div>
        <AreaField label="Rows copied from your spreadsheet" hint="A name and grams or percent on each row; phase headings and a q.s. line are read too." rows={10} value={text} onChange={(event) => setText(event.target.value)} />
        <PlanTable plan={plan} />
      </div>
      <div>
        {plan.lines.length > 0 ? <NewProductForm act={`Create with ${sayCount(plan.lines.length, 'line')}`} onCreated={fill} /> : <p className="quiet">Paste first. What is read shows here, and nothing is created before you say so.</p>}
        {done !== null ? <div className="mt-4"><Progress label="Writing down materials" done={done} all={plan.missing.length + 1} /><p className="quiet">{done} of {plan.missing.length} new materials written down</p></div> : null}
        {failure ? <div className="mt-4"><Banner weight="stop" title="Not all could be written down.">{sayError(failure)} The product itself stands in Products.</Banner></div> : null}
      </div>
    </div>
  );
}

async function fillFormula(product: Product, plan: PastePlan, onStep: (done: number) => void): Promise<Product> {
  const ids = new Map([...plan.known].map(([name, one]) => [name, one.id]));
  onStep(0);
  for (const [index, name] of plan.missing.entries()) {
    ids.set(name, (await call(createMaterial, { body: materialFromName(name) })).id);
    onStep(index + 1);
  }
  const formula = formulaOf(plan.lines, (name) => ids.get(name)!, () => crypto.randomUUID());
  return call(updateProduct, { params: { id: product.id }, body: { version: product.version, draft: { ...product.draft, formula } } });
}

function PlanTable({ plan }: { plan: PastePlan }) {
  return (
    <div className="mt-3 grid gap-3" role="status">
      {plan.problems.length > 0 ? (
        <Banner weight="decide" title={`${sayCount(plan.problems.length, 'row')} not read.`}>
          <ul>{plan.problems.slice(0, 8).map((one) => <li key={`${one.row}-${one.message}`}>Row {one.row}: {one.message}</li>)}</ul>
        </Banner>
      ) : null}
      {plan.lines.length > 0 ? (
        <div className="max-h-[50vh] overflow-auto">
          <table className="table" aria-label="As read">
            <thead><tr><th scope="col">Phase</th><th scope="col">Material</th><th scope="col" className="num">g</th><th scope="col" className="num">%</th><th scope="col">In the house</th></tr></thead>
            <tbody>
              {plan.lines.map((line) => (
                <tr key={line.row}>
                  <td className="quiet">{line.phase}</td><td>{line.name}</td><td className="num">{line.qs ? 'q.s.' : line.grams}</td><td className="num">{line.percent}</td>
                  <td>{plan.known.has(line.name) ? <span className="quiet">{plan.known.get(line.name)!.tradeName}</span> : <VerdictWord weight="note">new, to be completed</VerdictWord>}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      ) : null}
    </div>
  );
}
