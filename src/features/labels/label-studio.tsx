import { useDeferredValue, useMemo, useState } from 'react';
import './labels.css';
import { layOutLabel } from '#shared/artwork/layout.ts';
import { exactMillimetres } from '#shared/artwork/lengths.ts';
import { plexMetrics } from '#shared/artwork/plex-metrics.ts';
import type { Misfit } from '#shared/artwork/misfits.ts';
import type { Scene } from '#shared/artwork/scene.ts';
import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import type { Picture } from '#shared/contracts/pictures.contract.ts';
import type { LabelResult } from '#shared/artwork/label-of-document.ts';
import type { HouseDefaults } from '#shared/product/to-document.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button, TextButton } from '#src/ui/button.tsx';
import { CheckField } from '#src/ui/field.tsx';
import { Panel, Sheet } from '#src/ui/sheet.tsx';
import { sayDay } from '#src/lib/say.ts';
import { BottleView } from './bottle-view.tsx';
import { HandLayer } from './hand/hand-layer.tsx';
import { HandPanel } from './hand/hand-panel.tsx';
import { useHand } from './hand/use-hand.ts';
import { handKeys } from './hand/use-hand-keys.ts';
import { CalibrationDialog } from './calibration-dialog.tsx';
import { useCalibration } from './calibration.ts';
import { LabelBoard, type Shown } from './label-board.tsx';
import { labelOfDraft } from './label-of-draft.ts';
import { LabelSettingsPanel } from './label-settings-panel.tsx';
import { PressList } from './press-list.tsx';
import { useIsNarrow } from './use-is-narrow.ts';

export interface LabelStudioProps {
  readonly draft: ProductDraft;
  /** The result of the label's market; absent while nothing is computed. */
  readonly result: LabelResult | undefined;
  /** The house's pictures; absent until they are known. */
  readonly pictures?: readonly Picture[] | undefined;
  /** What the house prints where the product says nothing. */
  readonly house?: HouseDefaults | undefined;
  /** `join` names changes that are one step of the history. */
  readonly onChange: (label: LabelSettings, join?: string) => void;
  /** Fetches the press file; its refusal is told in words here. */
  readonly onPressFile: () => Promise<void>;
  readonly isLocked?: boolean;
}

const ZOOMS: readonly (readonly [number, string])[] = [[1, 'True size'], [1.5, '150 %'], [2.5, '250 %'], [0, 'Fit']];
const LAYERS: readonly (readonly [keyof Shown, string])[] = [['die', 'Die line'], ['bleed', 'Bleed'], ['panels', 'Panels'], ['rings', 'Rings']];

/** The label at true size, what stands before the press, and all that the label is set from. */
export function LabelStudio({ draft, result, house, pictures, onChange, onPressFile, isLocked = false }: LabelStudioProps) {
  const deferred = useDeferredValue(draft);
  const layout = useMemo(() => layOutLabel({ ...labelOfDraft(deferred, result, house), pictures }, plexMetrics), [deferred, result, house, pictures]);
  const [zoom, setZoom] = useState(1);
  const [shown, setShown] = useState<Shown>({ die: true, bleed: true, panels: true, rings: true });
  const [isMeasuring, setIsMeasuring] = useState(false);
  const calibration = useCalibration();
  const { misfits, checks } = layout;
  const [byHand, setByHand] = useState(false);
  // Things are moved on the straight sheet; a cone bends them afterwards.
  const scene = byHand ? layout.straight : layout.scene;
  const hand = useHand({ label: draft.label, scene: layout.straight, pictures, onChange });
  const container = draft.label.container;
  // Under the board while composing: a sentence that comes and goes must not push the label from under the hand.
  const told = misfits.length > 0 ? <Misfits misfits={misfits} /> : null;
  const handPanel = byHand && scene ? <HandPanel hand={hand} scene={scene} isLocked={isLocked} /> : null;
  const isNarrow = useIsNarrow();
  return (
    <Sheet className="hung studio">
      <div className="studio-main">
        <div className="tool">
          <div className="switch" role="group" aria-label="Scale">
            {ZOOMS.map(([value, word]) => <button key={value} type="button" aria-pressed={zoom === value} onClick={() => setZoom(value)}>{word}</button>)}
          </div>
          <button type="button" id="studio-hand" className="btn small" aria-pressed={byHand} onClick={() => { setByHand(!byHand); hand.choose(null); }}>Compose by hand</button>
          {LAYERS.map(([key, word]) => <CheckField key={key} label={word} checked={shown[key]} onChange={() => setShown({ ...shown, [key]: !shown[key] })} />)}
          <span className="calibrated quiet">
            {calibration.on ? `Calibrated on ${sayDay(calibration.on)}. ` : 'This screen was never measured. '}
            <TextButton mini onClick={() => setIsMeasuring(true)}>Check with a bank card</TextButton>
          </span>
        </div>
        {byHand ? null : told}
        {scene ? <LabelBoard scene={scene} misfits={misfits} shown={shown} pixelsPerMm={calibration.pixelsPerMm} zoom={zoom} {...(byHand && { onKeyDown: handKeys(hand, isLocked), onEmptyPress: () => hand.choose(null), over: (px: number) => <HandLayer hand={hand} scene={scene} px={px} isLocked={isLocked} /> })} /> : null}
        {byHand ? told : null}
        {isNarrow ? handPanel : null}
        {scene ? <SpecLine scene={scene} label={draft.label} /> : null}
        {scene ? <PressList checks={checks} /> : null}
        {scene && scene.shape !== 'taper' ? (
          <Panel title={scene.shape === 'cylinder' ? 'On the bottle' : 'On its face'}>
            <BottleView scene={scene} diameterMm={container.shape === 'cylinder' ? Number(container.diameterMm) : 0} />
          </Panel>
        ) : null}
      </div>
      <aside className="studio-side" aria-label="Settings of the label">
        {isNarrow ? null : handPanel}
        <Panel title="Press file">
          <PressFile isReady={misfits.length === 0 && !checks.some((check) => check.state === 'stop')} onPressFile={onPressFile} standard={draft.label.press.standard} />
        </Panel>
        <LabelSettingsPanel draft={draft} onChange={onChange} isLocked={isLocked} />
      </aside>
      <CalibrationDialog key={String(isMeasuring)} isOpen={isMeasuring} onClose={() => setIsMeasuring(false)} calibration={calibration} />
    </Sheet>
  );
}

function Misfits({ misfits }: { misfits: readonly Misfit[] }) {
  const isPlace = misfits.every(({ direction }) => direction === 'place');
  return (
    <div className="misfits" role="status">
      <Banner weight="stop" title={isPlace ? 'Some things stand in each other’s way' : 'This label does not hold everything'}>
        <ul>{[...new Set(misfits.map(({ message }) => message))].map((message) => <li key={message}>{message}</li>)}</ul>
        {isPlace ? null : <p>Choose a larger container or shorter texts. Nothing is set smaller than the market allows.</p>}
      </Banner>
    </div>
  );
}

/** Downloads the press file; says what goes on and what went wrong. */
function PressFile({ isReady, onPressFile, standard }: { isReady: boolean; onPressFile: () => Promise<void>; standard: string }) {
  const [state, setState] = useState<{ busy: boolean; said: string; failed: boolean }>({ busy: false, said: '', failed: false });
  const fetchFile = async (): Promise<void> => {
    setState({ busy: true, said: 'Setting the press file.', failed: false });
    try {
      await onPressFile();
      setState({ busy: false, said: 'The press file was handed to the browser.', failed: false });
    } catch (error) {
      setState({ busy: false, said: error instanceof Error ? error.message : 'The press file could not be made.', failed: true });
    }
  };
  return (
    <div className="press-file">
      <Button weight="act" icon="download" busy={state.busy} disabled={!isReady} onClick={() => void fetchFile()}>Download the press file</Button>
      <p className={state.failed ? 'error' : 'hint'} role="status">
        {state.said || (isReady ? `${standard}, one page, text as text.` : 'Something above still stops the press.')}
      </p>
      <p className="hint">This list advises. Have your printer open the file and a person read the proof before labels are ordered.</p>
    </div>
  );
}

function SpecLine({ scene, label }: { scene: Scene; label: LabelSettings }) {
  const inks = [...new Set(scene.items.map((item) => item.ink))].map((key) => scene.inks[key]!).filter((ink) => ink.cmyk.some((part) => part > 0)).map((ink) => ink.name.toLowerCase());
  const parts: readonly (readonly [string, string])[] = [
    ['Trim', `${exactMillimetres(scene.trim.width)} × ${exactMillimetres(scene.trim.height)} mm`],
    ['Bleed', `${exactMillimetres(scene.bleed)} mm`],
    ...(scene.shape === 'taper' ? [['Unrolled', 'a cone: type on arcs, sides are radii'] as const] : scene.overlap > 0 ? [['Overlap', `${exactMillimetres(scene.overlap)} mm, right over left`] as const, ['Front', '0.4 of the round'] as const] : []),
    ['Press', `${label.press.standard}, ${label.press.condition}`],
    ['Inks', `${[...new Set(inks)].join(', ')}, die line`],
  ];
  return <p className="spec">{parts.map(([word, figure]) => <span key={word}>{word} <b>{figure}</b></span>)}</p>;
}
