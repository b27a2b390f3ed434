import type { LabelSettings, ProductDraft } from '#shared/contracts/product-draft.ts';
import { barcodeFault } from '#shared/artwork/barcode.ts';
import { readContainer } from '#shared/artwork/container.ts';
import { CONTAINERS, USUAL_OVERLAP_MM, USUAL_STOCK_MM, type UsualContainer } from '#shared/artwork/containers.ts';
import { PALETTES } from '#shared/artwork/inks.ts';
import { TEMPLATES, templateFor, templatesFor } from '#shared/artwork/layout.ts';
import { Panel } from '#src/ui/sheet.tsx';
import { SelectField, TextField } from '#src/ui/field.tsx';

type Container = LabelSettings['container'];
export interface SettingsPanelProps {
  readonly draft: ProductDraft;
  readonly onChange: (label: LabelSettings) => void;
  readonly isLocked: boolean;
}

const MARKETS = { EU: 'European Union', UK: 'Great Britain', US: 'United States', CA: 'Canada' } as const;
const LANGUAGES: readonly (readonly [string, string])[] = [['en', 'English'], ['fr', 'French'], ['de', 'German'], ['es', 'Spanish'], ['it', 'Italian'], ['nl', 'Dutch']];

function containerOf(usual: UsualContainer): Container {
  if (usual.shape === 'taper') return { shape: 'taper', topDiameterMm: usual.topDiameterMm!, bottomDiameterMm: usual.bottomDiameterMm!, labelHeightMm: usual.labelHeightMm!, overlapMm: USUAL_OVERLAP_MM, name: usual.name };
  return usual.shape === 'flat'
    ? { shape: 'flat', widthMm: usual.widthMm!, heightMm: usual.heightMm!, name: usual.name }
    : { shape: 'cylinder', diameterMm: usual.diameterMm!, labelHeightMm: usual.labelHeightMm!, overlapMm: USUAL_OVERLAP_MM, stockMm: USUAL_STOCK_MM, name: usual.name };
}

type Measure = Exclude<keyof UsualContainer, 'slug' | 'name' | 'shape'>;
/** What tells one container of a shape from another. */
const MEASURES: Readonly<Record<Container['shape'], readonly Measure[]>> = { cylinder: ['diameterMm', 'labelHeightMm'], flat: ['widthMm', 'heightMm'], taper: ['topDiameterMm', 'bottomDiameterMm', 'labelHeightMm'] };

function usualOf(container: Container): string {
  const keys = MEASURES[container.shape];
  const given: Readonly<Partial<Record<Measure, string>>> = container;
  const found = CONTAINERS.find((usual) => usual.shape === container.shape && keys.every((key) => usual[key] === given[key]));
  return found?.slug ?? '';
}

/** Container, market, template, ink and bar code of the label. */
export function LabelSettingsPanel({ draft, onChange, isLocked }: SettingsPanelProps) {
  const { label } = draft;
  const change = (part: Partial<LabelSettings>): void => onChange({ ...label, ...part });
  return (
    <>
      <Panel title="Container" className="settings">
        <ContainerFields container={label.container} onChange={(container) => change({ container })} isLocked={isLocked} />
      </Panel>
      <Panel title="Label" className="settings">
        <div className="settings-grid">
          <SelectField label="Market" value={label.market} disabled={isLocked} onChange={(event) => change({ market: event.target.value as LabelSettings['market'] })}>
            {draft.markets.includes(label.market) ? null : <option value={label.market}>{MARKETS[label.market]}, not sold there</option>}
            {draft.markets.map((market) => <option key={market} value={market}>{MARKETS[market]}</option>)}
          </SelectField>
          <SelectField
            label="Language" value={label.languages.join('+')} disabled={isLocked}
            onChange={(event) => change({ languages: event.target.value.split('+') })}
          >
            {LANGUAGES.map(([code, name]) => <option key={code} value={code}>{name}</option>)}
            <option value="en+fr">English and French</option>
            {LANGUAGES.some(([code]) => code === label.languages.join('+')) || label.languages.join('+') === 'en+fr' ? null : <option value={label.languages.join('+')}>{label.languages.join(', ')}</option>}
          </SelectField>
          <SelectField label="Template" value={templateFor(label)} disabled={isLocked} onChange={(event) => change({ template: event.target.value })} hint={TEMPLATES.find((template) => template.slug === templateFor(label))?.temper} className="wide">
            {templatesFor(label.container.shape).map((template) => <option key={template.slug} value={template.slug}>{template.name}</option>)}
          </SelectField>
          <fieldset className="inks wide" disabled={isLocked}>
            <legend className="field-label">House ink</legend>
            {PALETTES.map((palette) => (
              <label key={palette.slug} title={palette.ink.name}>
                <input type="radio" name="ink" value={palette.slug} checked={label.ink === palette.slug || (palette === PALETTES[0] && !PALETTES.some((other) => other.slug === label.ink))} onChange={() => change({ ink: palette.slug })} />
                <i style={{ background: `linear-gradient(90deg, ${palette.ink.screen} 0 50%, ${palette.tint.screen} 50% 75%, ${palette.light.screen} 75%)` }} aria-hidden="true" />
                <span>{palette.ink.name}</span>
              </label>
            ))}
          </fieldset>
        </div>
      </Panel>
      <Panel title="Barcode" className="settings">
        <BarcodeFields barcode={label.barcode} onChange={(barcode) => change({ barcode })} isLocked={isLocked} />
      </Panel>
    </>
  );
}

function ContainerFields({ container, onChange, isLocked }: { container: Container; onChange: (container: Container) => void; isLocked: boolean }) {
  const sheet = readContainer(container);
  const faultOf = (field: string): string | undefined => ('faults' in sheet ? sheet.faults.find((fault) => fault.field === field)?.message : undefined);
  const pick = (slug: string): void => {
    const usual = CONTAINERS.find((candidate) => candidate.slug === slug);
    if (usual) onChange(containerOf(usual));
  };
  const shape = (next: string): void => {
    if (next !== container.shape) onChange(containerOf(CONTAINERS.find((usual) => usual.shape === next)!));
  };
  const field = (label: string, key: string, value: string, set: (text: string) => Container) => (
    <TextField key={key} label={label} value={value} disabled={isLocked} figure error={faultOf(key)} onChange={(event) => onChange(set(event.target.value.replace(',', '.').trim()))} />
  );
  const own = { ...container, name: undefined };
  return (
    <div className="settings-grid">
      <SelectField label="Start from" value={usualOf(container)} disabled={isLocked} onChange={(event) => pick(event.target.value)} className="wide" hint="Usual sizes, no standard: measure the bottle in hand.">
        <option value="">Own measures</option>
        <optgroup label="Round">{CONTAINERS.filter((usual) => usual.shape === 'cylinder').map((usual) => <option key={usual.slug} value={usual.slug}>{usual.name}</option>)}</optgroup>
        <optgroup label="Tapered">{CONTAINERS.filter((usual) => usual.shape === 'taper').map((usual) => <option key={usual.slug} value={usual.slug}>{usual.name}</option>)}</optgroup>
        <optgroup label="Flat">{CONTAINERS.filter((usual) => usual.shape === 'flat').map((usual) => <option key={usual.slug} value={usual.slug}>{usual.name}</option>)}</optgroup>
      </SelectField>
      <div className="switch wide" role="group" aria-label="Shape">
        <button type="button" disabled={isLocked} aria-pressed={container.shape === 'cylinder'} onClick={() => shape('cylinder')}>Round</button>
        <button type="button" disabled={isLocked} aria-pressed={container.shape === 'taper'} onClick={() => shape('taper')}>Tapered</button>
        <button type="button" disabled={isLocked} aria-pressed={container.shape === 'flat'} onClick={() => shape('flat')}>Flat</button>
      </div>
      {own.shape === 'taper' ? (
        <>
          {field('Upper diameter, mm', 'topDiameterMm', own.topDiameterMm, (topDiameterMm) => ({ ...own, topDiameterMm }))}
          {field('Lower diameter, mm', 'bottomDiameterMm', own.bottomDiameterMm, (bottomDiameterMm) => ({ ...own, bottomDiameterMm }))}
          {field('Height along the wall, mm', 'labelHeightMm', own.labelHeightMm, (labelHeightMm) => ({ ...own, labelHeightMm }))}
          {field('Overlap, mm', 'overlapMm', own.overlapMm, (overlapMm) => ({ ...own, overlapMm }))}
        </>
      ) : own.shape === 'cylinder' ? (
        <>
          {field('Diameter, mm', 'diameterMm', own.diameterMm, (diameterMm) => ({ ...own, diameterMm }))}
          {field('Label height, mm', 'labelHeightMm', own.labelHeightMm, (labelHeightMm) => ({ ...own, labelHeightMm }))}
          {field('Overlap, mm', 'overlapMm', own.overlapMm, (overlapMm) => ({ ...own, overlapMm }))}
          {field('Stock, mm', 'stockMm', own.stockMm ?? USUAL_STOCK_MM, (stockMm) => ({ ...own, stockMm }))}
        </>
      ) : (
        <>
          {field('Width, mm', 'widthMm', own.widthMm, (widthMm) => ({ ...own, widthMm }))}
          {field('Height, mm', 'heightMm', own.heightMm, (heightMm) => ({ ...own, heightMm }))}
        </>
      )}
    </div>
  );
}

function BarcodeFields({ barcode, onChange, isLocked }: { barcode: LabelSettings['barcode']; onChange: (barcode: LabelSettings['barcode']) => void; isLocked: boolean }) {
  const shown = barcode ?? { symbology: 'EAN-13' as const, digits: '' };
  const fault = shown.digits === '' ? null : barcodeFault(shown);
  return (
    <div className="settings-grid">
      <SelectField label="Kind" value={shown.symbology} disabled={isLocked} onChange={(event) => onChange({ ...shown, symbology: event.target.value as 'EAN-13' | 'UPC-A' })}>
        <option value="EAN-13">EAN-13</option>
        <option value="UPC-A">UPC-A</option>
      </SelectField>
      <TextField
        label="Figures" value={shown.digits} disabled={isLocked} inputMode="numeric" error={fault ?? undefined}
        hint={fault ? undefined : shown.digits === '' ? 'Leave it empty for a label without a barcode.' : 'The check figure agrees.'}
        onChange={(event) => {
          const digits = event.target.value.replace(/\s/g, '').slice(0, 14);
          onChange(digits === '' ? null : { ...shown, digits });
        }}
      />
    </div>
  );
}
