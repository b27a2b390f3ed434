import { memo, type ReactNode } from 'react';
import type { House } from '#shared/contracts/house.contract.ts';
import type { ProductDraft } from '#shared/contracts/product-draft.ts';
import { MARKETS, type Category, type Market, type ProductFlag } from '#shared/law/types.ts';
import { sayDay } from '#src/lib/say.ts';
import { AreaField, CheckField, SelectField, TextField } from '#src/ui/field.tsx';
import { TextButton } from '#src/ui/button.tsx';
import { FLAG_WORDS } from './aspects.ts';
import { FactFields } from './fact-fields.tsx';
import { TextList } from './text-list.tsx';
import { readNumber } from './read-amount.ts';
import './particulars.css';

export interface ParticularsProps {
  readonly draft: ProductDraft;
  readonly house: House;
  readonly categories: ReadonlyMap<string, Category>;
  /** Facts that some verdict waits for. */
  readonly asked: readonly string[];
  readonly today: string;
  readonly isReadOnly: boolean;
  readonly onChange: (recipe: (draft: ProductDraft) => ProductDraft, join?: string) => void;
  readonly onSettle: () => void;
  /** Where claims are judged. */
  readonly claimsLink?: ReactNode;
}

const MARKET_NAMES: Readonly<Record<Market, string>> = { EU: 'European Union', UK: 'Great Britain', US: 'United States', CA: 'Canada' };

/** Typing an amount leaves everything here alone. */
function sameParticulars(before: ParticularsProps, after: ParticularsProps): boolean {
  const keys = (Object.keys(after.draft) as (keyof ProductDraft)[]).filter((key) => key !== 'formula' && key !== 'declaration' && key !== 'label');
  const isSame = keys.every((key) => before.draft[key] === after.draft[key]);
  return isSame && before.house === after.house && before.isReadOnly === after.isReadOnly && before.today === after.today && before.asked.join() === after.asked.join();
}

/** Everything about the product that is not its formula: what it is, where it is sold, and what its label must say. */
export const Particulars = memo(function Particulars(props: ParticularsProps) {
  const { draft, house, categories, isReadOnly, onChange, onSettle } = props;
  const set = <K extends keyof ProductDraft>(key: K, value: ProductDraft[K], join?: string) => onChange((before) => ({ ...before, [key]: value }), join);
  const particular = <K extends keyof ProductDraft['particulars']>(key: K, value: ProductDraft['particulars'][K]) =>
    onChange((before) => ({ ...before, particulars: { ...before.particulars, [key]: value } }), `particular:${key}`);
  const text = (key: 'usContact' | 'canadaContact' | 'countryOfOrigin' | 'batchCode' | 'function' | 'directions', label: string, standing = '') => ({
    label,
    readOnly: isReadOnly,
    value: draft.particulars[key],
    placeholder: standing === '' ? undefined : `${standing} (from the house)`,
    onChange: (event: { target: { value: string } }) => particular(key, event.target.value),
    onBlur: onSettle,
  });
  const category = categories.get(draft.category);
  return (
    <div className="particulars">
      <Group title="Product">
        <TextField label="Name" readOnly={isReadOnly} value={draft.name} error={draft.name.trim() === '' ? 'Give it a name.' : undefined} maxLength={255} onChange={(event) => set('name', event.target.value, 'name')} onBlur={onSettle} />
        <TextField label="Brand" readOnly={isReadOnly} value={draft.brand} maxLength={255} onChange={(event) => set('brand', event.target.value, 'brand')} onBlur={onSettle} />
        <SelectField label="Kind of product" disabled={isReadOnly} value={draft.category} hint={category ? category.exposure : undefined} onChange={(event) => set('category', event.target.value)}>
          {[...categories.values()].toSorted((a, b) => a.title.localeCompare(b.title)).map((each) => <option key={each.slug} value={each.slug}>{each.title}</option>)}
        </SelectField>
        <NetContent {...props} />
        <Durability {...props} />
      </Group>
      <Group title="Markets and use">
        <fieldset>
          <legend className="field-label">Sold in</legend>
          {MARKETS.map((market) => (
            <CheckField key={market} label={MARKET_NAMES[market]} disabled={isReadOnly || (draft.markets.length === 1 && draft.markets[0] === market)} checked={draft.markets.includes(market)} onChange={(event) => set('markets', MARKETS.filter((each) => (each === market ? event.target.checked : draft.markets.includes(each))))} />
          ))}
        </fieldset>
        <fieldset>
          <legend className="field-label">Use</legend>
          {(Object.keys(FLAG_WORDS) as ProductFlag[]).map((flag) => (
            <CheckField key={flag} label={FLAG_WORDS[flag]} disabled={isReadOnly} checked={draft.flags[flag] ?? category?.flags[flag] ?? false} onChange={(event) => set('flags', { ...draft.flags, [flag]: event.target.checked })} />
          ))}
        </fieldset>
        <DayField label="First sold on" day={draft.placedOnMarket} today={props.today} isReadOnly={isReadOnly} onDay={(day) => set('placedOnMarket', day)} />
        <DayField label="Still on the shelf on" day={draft.availableOn} today={props.today} isReadOnly={isReadOnly} onDay={(day) => set('availableOn', day)} />
      </Group>
      <Group title="Answers the law asks for">
        <FactFields facts={draft.facts} known={category?.facts ?? {}} asked={props.asked} isReadOnly={isReadOnly} onFacts={(facts, join) => set('facts', facts, join)} onSettle={onSettle} />
      </Group>
      <Group title="On the label">
        <TextField {...text('function', 'Function')} />
        <AreaField {...text('directions', 'Directions')} rows={2} />
        <TextList title="Warnings" items={draft.particulars.warnings} isReadOnly={isReadOnly} addWord="Add a warning" onItems={(items) => particular('warnings', items)} onSettle={onSettle} />
        <TextField {...text('batchCode', 'Batch code')} />
        <TextField {...text('countryOfOrigin', 'Country of origin', house.countryOfOrigin)} />
        {draft.markets.includes('US') ? <TextField {...text('usContact', 'Contact for the US', house.usContact)} /> : null}
        {draft.markets.includes('CA') ? <TextField {...text('canadaContact', 'Contact for Canada', house.canadaContact)} /> : null}
      </Group>
      <Group title="Responsible person">
        {draft.markets.map((market) => {
          const own = draft.particulars.responsiblePerson[market];
          const standing = house.responsiblePerson[market];
          const write = (change: Partial<{ name: string; address: string }>) => particular('responsiblePerson', { ...draft.particulars.responsiblePerson, [market]: { name: '', address: '', ...own, ...change } });
          return (
            <div className="party" key={market}>
              <TextField label={`${MARKET_NAMES[market]}, name`} readOnly={isReadOnly} value={own?.name ?? ''} placeholder={standing ? `${standing.name} (from the house)` : undefined} onChange={(event) => write({ name: event.target.value })} onBlur={onSettle} />
              <TextField label={`${MARKET_NAMES[market]}, address`} readOnly={isReadOnly} value={own?.address ?? ''} placeholder={standing ? `${standing.address} (from the house)` : undefined} onChange={(event) => write({ address: event.target.value })} onBlur={onSettle} />
            </div>
          );
        })}
      </Group>
      <Group title="Claims and shades">
        <TextList title="Claims" items={draft.claims} isReadOnly={isReadOnly} addWord="Add a claim" onItems={(claims) => set('claims', claims, 'claims')} onSettle={onSettle} />
        {draft.claims.length > 0 && props.claimsLink ? <p className="hint">{props.claimsLink}</p> : null}
        {category?.decorative || draft.mayContain.length > 0 ? (
          <TextField
            label="May contain, by CI number, parted by commas"
            readOnly={isReadOnly}
            defaultValue={draft.mayContain.map((shade) => shade.inci).join(', ')}
            onBlur={(event) => set('mayContain', event.target.value.split(',').flatMap((each) => (each.trim() === '' ? [] : [{ inci: each.trim() }])))}
          />
        ) : null}
      </Group>
    </div>
  );
}, sameParticulars);

function Group({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="group" aria-label={title}>
      <h3>{title}</h3>
      {children}
    </section>
  );
}

function DayField({ label, day, today, isReadOnly, onDay }: { label: string; day: string | null; today: string; isReadOnly: boolean; onDay: (day: string | null) => void }) {
  return (
    <div className="day-field">
      <TextField label={label} type="date" readOnly={isReadOnly} value={day ?? today} onChange={(event) => event.target.value !== '' && onDay(event.target.value)} hint={day === null ? `${sayDay(today)}, always today` : sayDay(day)} />
      {day !== null && !isReadOnly ? <TextButton mini onClick={() => onDay(null)}>always today<span className="sr-only">: {label}</span></TextButton> : null}
    </div>
  );
}

function NetContent({ draft, isReadOnly, onChange, onSettle }: ParticularsProps) {
  const content = draft.netContent;
  const read = readNumber(content?.value ?? '');
  return (
    <div className="pair">
      <TextField
        label="Net content"
        figure
        readOnly={isReadOnly}
        value={content?.value ?? ''}
        error={read.fault}
        onChange={(event) => {
          const next = readNumber(event.target.value);
          if (next.fault) return;
          onChange((before) => ({ ...before, netContent: next.text === '' ? null : { value: next.text, unit: before.netContent?.unit ?? 'ml' } }), 'net');
        }}
        onBlur={onSettle}
      />
      <SelectField label="Unit" disabled={isReadOnly || !content} value={content?.unit ?? 'ml'} onChange={(event) => onChange((before) => ({ ...before, netContent: before.netContent && { ...before.netContent, unit: event.target.value === 'g' ? 'g' : 'ml' } }))}>
        <option value="ml">ml</option>
        <option value="g">g</option>
      </SelectField>
    </div>
  );
}

function Durability({ draft, isReadOnly, onChange, onSettle }: ParticularsProps) {
  const kept = draft.durability;
  const set = (durability: ProductDraft['durability']) => onChange((before) => ({ ...before, durability }), 'durability');
  return (
    <div className="pair">
      <SelectField label="Durability" disabled={isReadOnly} value={kept?.kind ?? ''} onChange={(event) => set(event.target.value === 'pao' ? { kind: 'pao', months: 12 } : event.target.value === 'best-before' ? { kind: 'best-before', date: `${new Date().getFullYear() + 2}-01` } : null)}>
        <option value="">not set</option>
        <option value="pao">months after opening</option>
        <option value="best-before">best before</option>
      </SelectField>
      {kept?.kind === 'pao' ? <TextField label="Months" type="number" min={1} max={120} readOnly={isReadOnly} value={kept.months} onChange={(event) => set({ kind: 'pao', months: Math.min(120, Math.max(1, Math.round(Number(event.target.value)) || 1)) })} onBlur={onSettle} /> : null}
      {kept?.kind === 'best-before' ? <TextField label="Month" type="month" readOnly={isReadOnly} value={kept.date.slice(0, 7)} onChange={(event) => /^\d{4}-\d{2}$/.test(event.target.value) && set({ kind: 'best-before', date: event.target.value })} onBlur={onSettle} /> : null}
    </div>
  );
}
