import { useCallback, useDeferredValue, useMemo, useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import type { FormulaLine } from '#shared/contracts/product-draft.ts';
import { paths } from '#src/app/paths.ts';
import { CopyText } from '#src/features/declaration/copy-text.tsx';
import { chooseOrder, placeKey } from '#src/features/declaration/free-order.ts';
import { PrintedList } from '#src/features/declaration/printed-list.tsx';
import { PrintedSpec } from '#src/features/declaration/printed-spec.tsx';
import '#src/features/declaration/declaration.css';
import { FormulaPanel } from '#src/features/formula/formula-panel.tsx';
import { Ladder } from '#src/features/ladder/ladder.tsx';
import { LadderTable } from '#src/features/ladder/ladder-table.tsx';
import { Readout } from '#src/features/ladder/readout.tsx';
import { newId } from '#src/features/formula/new-id.ts';
import { setGrams } from '#src/features/formula/recipes.ts';
import { ProcessSteps } from '#src/features/process/process-steps.tsx';
import { CountWords, railCounts, VerdictRail, type RailItem } from '#src/features/verdicts/rail.tsx';
import { follow, type Light } from '#src/features/workspace/light.ts';
import { Particulars } from '#src/features/workspace/particulars.tsx';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { useRemedies } from '#src/features/workspace/use-remedies.ts';
import { keysOfFinding } from '#src/features/workspace/view.ts';
import { Button, TextButton } from '#src/ui/button.tsx';
import { Panel, Sheet } from '#src/ui/sheet.tsx';

export function Component() {
  const page = useProductPage();
  const { desk, live, asOf, shelf, isReadOnly, nameOf } = page;
  const { draft, change } = desk;
  const navigate = useNavigate();
  const [light, setLight] = useState<Light>(null);
  const [asTable, setAsTable] = useState(false);
  // The list follows the keystroke itself; ladder and verdicts are drawn when it stands.
  const now = live.view;
  const view = useDeferredValue(now);
  const { result } = view;
  const lines = useMemo(() => draft.formula.phases.flatMap((phase) => phase.lines), [draft.formula.phases]);
  const everything = useMemo(() => [...view.entries, ...view.unnamed], [view]);
  // Names only: amounts change with every keystroke, and nothing that is lit depends on them here.
  const lineKey = lines.map((line) => line.materialId).join('|');
  const lineNames = useMemo(() => lineKey.split('|').map(nameOf), [lineKey, nameOf]);
  const lit = useMemo(() => follow(light, everything, (line) => lineNames[line] ?? ''), [light, everything, lineNames]);
  const rungs = useMemo(() => everything.filter((entry) => entry.zone !== 'may-contain'), [everything]);
  const lightKey = useCallback((key: string | null) => setLight(key === null ? null : { keys: [key] }), []);
  const lightLine = useCallback((line: number | null) => setLight(line === null ? null : { line }), []);
  const lightKeys = useCallback((keys: readonly string[] | null) => setLight(keys === null || keys.length === 0 ? null : { keys }), []);

  const free = useMemo(() => view.entries.filter((entry) => entry.isFree).map((entry) => entry.key), [view]);
  const moveFree = useCallback((key: string, place: number) => change(chooseOrder(asOf.market, placeKey(free, key, place)), `order:${asOf.market}`), [change, asOf.market, free]);
  const move = isReadOnly ? undefined : moveFree;
  const toDeclaration = useCallback(() => void navigate(paths.declaration(page.id) + page.search), [navigate, page.id, page.search]);
  const allLink = useMemo(() => <Link to={paths.verdicts(page.id) + page.search}>All verdicts, in every market</Link>, [page.id, page.search]);
  const onlyLit = light !== null && 'keys' in light && light.keys.length === 1 ? light.keys[0]! : null;
  const litPlace = onlyLit === null ? -1 : free.indexOf(onlyLit);
  const suspects = result.findings.find((finding) => finding.kind === 'sum-mismatch')?.suspects ?? [];
  const hasLines = lines.length > 0;

  const remedies = useRemedies(draft, live, isReadOnly);
  const items = useMemo<RailItem[]>(() => {
    if (!hasLines) return [];
    return result.findings.map((finding) => {
      const remedy = remedies.get(finding);
      return {
        finding,
        keys: keysOfFinding(finding, view.entries),
        act: remedy ? <Button small weight="act" onClick={() => change(setGrams(remedy.lineId, remedy.grams))}>Set {remedy.grams} g of {nameOf(remedy.materialId)}</Button> : undefined,
      };
    });
  }, [hasLines, result, remedies, view, change, nameOf]);

  return (
    <div className="wrap full">
      <Sheet className="hung">
        <div className="work">
          <FormulaPanel
            draft={draft}
            nameOf={nameOf}
            suspects={suspects}
            lit={lit.lines}
            isReadOnly={isReadOnly}
            onChange={change}
            onSettle={desk.settle}
            onLight={lightLine}
            onBring={shelf.bring}
            onPut={shelf.put}
            onOpenMaterial={(materialId: FormulaLine['materialId']) => void navigate(paths.material(materialId))}
          />
          <Panel title="Concentration ladder" className="lad" end={<TextButton aria-pressed={asTable} onClick={() => setAsTable(!asTable)}>{asTable ? 'See the ladder' : 'Read as a table'}</TextButton>}>
            {!hasLines ? (
              <p className="quiet">Every ingredient will stand here at its share, as soon as the formula has a line.</p>
            ) : asTable ? (
              <LadderTable rows={everything} lit={lit.keys} onLight={lightKey} />
            ) : (
              <Ladder
                rungs={rungs}
                lines={view.lines}
                pairs={view.pairs}
                lit={lit.keys}
                onLight={lightKey}
                onMove={move}
                onOpen={toDeclaration}
              />
            )}
            {hasLines ? (
              <Readout
                told={lit.told}
                rest={`Point at a line, a rung or a word: what belongs together lights up. ${result.declaration.freeLine === 'below 1 %' ? 'Below 1 %' : 'At 1 % and below'}, drag a row, or press Alt with an arrow key.`}
                move={litPlace < 0 || !move ? undefined : {
                  onEarlier: litPlace > 0 ? () => move(onlyLit!, litPlace - 1) : undefined,
                  onLater: litPlace < free.length - 1 ? () => move(onlyLit!, litPlace + 1) : undefined,
                }}
              />
            ) : null}
          </Panel>
          <div className="right">
            <Panel title="Declaration" end={<CopyText text={hasLines ? now.result.declaration.text : ''} />}>
              <div className="printed-wrap">
                <PrintedList heading={now.result.declaration.heading} entries={now.entries} totalGrams={now.totalGrams} lit={lit.keys} onLight={lightKey} market={asOf.market} label={`Ingredients for ${asOf.market}, as printed`} />
                <PrintedSpec market={asOf.market} allergens={result.allergens.length === 0 ? null : result.allergens.filter((allergen) => allergen.disclose).length} />
              </div>
              <p className="hint mt-2">True size. Dotted words wait for a decision; the dots are not printed.</p>
            </Panel>
            <Panel title="Verdicts" end={<CountWords counts={railCounts(items)} />}>
              {hasLines ? (
                <VerdictRail items={items} release={page.engine.law.release} lit={lit.keys} onLight={lightKeys} all={allLink} />
              ) : (
                <p className="quiet">Nothing to judge yet.</p>
              )}
            </Panel>
          </div>
        </div>
        <Panel title="Process" className="product-lower">
          <ProcessSteps draft={draft} findings={page.handling} unit={page.house.temperatureUnit} isReadOnly={isReadOnly} newId={() => newId('step')} onChange={change} onSettle={desk.settle} />
        </Panel>
        <Panel title="Particulars" id="particulars">
          <Particulars
            draft={draft}
            house={page.house}
            categories={page.engine.law.categories}
            asked={[...new Set(result.findings.flatMap((finding) => finding.needs ?? []))]}
            today={page.today}
            isReadOnly={isReadOnly}
            onChange={change}
            onSettle={desk.settle}
            claimsLink={<Link to={`${paths.verdicts(page.id)}${page.search}#claims`}>What each market says of them, and their evidence</Link>}
          />
        </Panel>
      </Sheet>
    </div>
  );
}
