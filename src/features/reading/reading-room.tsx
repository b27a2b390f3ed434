import type { ReactNode } from 'react';
import { LIST_LAW } from '#shared/engine/list-law.ts';
import type { Finding } from '#shared/engine/types.ts';
import { MARKETS, type Category, type Market } from '#shared/law/types.ts';
import type { Reading } from '#shared/reading/read-list.ts';
import { sayCount, sayDay } from '#src/lib/say.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button, TextButton } from '#src/ui/button.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { AreaField, SelectField, TextField } from '#src/ui/field.tsx';
import { Panel } from '#src/ui/sheet.tsx';
import { BoundsTable } from './bounds-table.tsx';
import './reading.css';

/** A list of an invented pack, for a first look. */
export const EXAMPLE = 'Ingredients: Aqua (Water), Sodium Laureth Sulfate, Cocamidopropyl Betaine, Glycerin, Sodium Chloride, Phenoxyetanol, Juniperus Communis Fruit Oil*, Parfum, Citric Acid, Limonene**, Linalool**, Butylphenyl Methylpropional, CI 19140. *from organic farming **from essential oils';

export interface ReadingRoomProps {
  readonly text: string;
  readonly market: Market;
  readonly category: string;
  readonly day: string;
  readonly covered: { readonly from: string; readonly until: string };
  readonly categories: readonly Category[];
  readonly reading: Reading | null;
  readonly isBehind: boolean;
  readonly isKept: boolean;
  readonly onText: (text: string) => void;
  readonly onAsk: (key: 'market' | 'category' | 'on', value: string) => void;
  readonly onChoose: (written: string, inci: string) => void;
  /** Everything that hangs on what was found: the verdicts, and the way on to a product. */
  readonly verdicts: (findings: readonly Finding[]) => ReactNode;
  readonly start: ReactNode;
}

/** A list from a pack, an offer or an old label: its names, the bounds on their shares, and what the law says of it. */
export function ReadingRoom(props: ReadingRoomProps) {
  const { reading, market, isBehind } = props;
  const read = reading && !('mistake' in reading) ? reading : null;
  return (
    <div className="reading">
      <section className="paste panel" aria-label="The list">
        <Asking {...props} />
        <AreaField
          label="The list, as it stands on the pack"
          hint="Headings, bullets, percentages, footnotes and line breaks may stay."
          rows={13}
          spellCheck={false}
          value={props.text}
          onChange={(event) => props.onText(event.target.value)}
        />
        <p className="quiet kept">
          {props.text === '' ? null : props.isKept ? 'Kept on this computer only.' : 'This browser keeps nothing: the text is gone when you leave.'}
          {props.text === '' ? null : <TextButton mini onClick={() => props.onText('')}>Clear</TextButton>}
        </p>
      </section>
      <div className="found" aria-busy={isBehind}>
        {reading === null ? (
          <EmptyState title="Nothing pasted yet." acts={<Button onClick={() => props.onText(EXAMPLE)}>Read an example</Button>}>
            Paste an ingredient list: of a label in your hand, a contract maker’s offer, your own old stock. Its names, the share that each can have and what the law says of it stand here as you type.
          </EmptyState>
        ) : null}
        {reading && 'mistake' in reading ? <Banner weight="decide" title="Not read.">{reading.mistake}</Banner> : null}
        {read ? (
          <>
            <Panel title="What the list tells" aside={sayNames(read.names.map(({ one }) => one.match))}>
              <BoundsTable names={read.names} freeLine={LIST_LAW[market].line} onChoose={props.onChoose} />
              <p className="quiet note">Each share lies within its bounds whatever the formula is: by the descending order, the part below the 1 % line in any order, the maxima of the law, and a sum of 100 %. “At most 1” includes what comes as near to 1 as you like.</p>
            </Panel>
            {props.verdicts(read.findings)}
            <Panel title="Go on from here">{props.start}</Panel>
          </>
        ) : null}
      </div>
    </div>
  );
}

function Asking({ market, category, day, covered, categories, onAsk }: ReadingRoomProps) {
  const beyond = day < covered.from ? `The law data begin on ${sayDay(covered.from)}.` : day > covered.until ? `The law data end on ${sayDay(covered.until)}; what comes later is not guessed.` : undefined;
  return (
    <div className="asking">
      <div>
        <span className="field-label" id="reading-market">Sold in</span>
        <div className="switch" role="group" aria-labelledby="reading-market">
          {MARKETS.map((each) => <button key={each} type="button" aria-pressed={each === market} onClick={() => onAsk('market', each)}>{each}</button>)}
        </div>
      </div>
      <SelectField label="What it is" value={category} onChange={(event) => onAsk('category', event.target.value)}>
        {(['rinse-off', 'leave-on'] as const).map((exposure) => (
          <optgroup key={exposure} label={exposure === 'rinse-off' ? 'Rinsed off' : 'Left on'}>
            {categories.filter((one) => one.exposure === exposure).map((one) => <option key={one.slug} value={one.slug}>{one.title}</option>)}
          </optgroup>
        ))}
      </SelectField>
      <TextField label="As sold on" type="date" min={covered.from} max={covered.until} defaultValue={day} error={beyond} onChange={(event) => event.target.value !== '' && onAsk('on', event.target.value)} />
    </div>
  );
}

function sayNames(matches: readonly string[]): string {
  const count = (match: string) => matches.filter((one) => one === match).length;
  const known = count('exact') + count('synonym');
  return [
    sayCount(matches.length, 'name'),
    ...(known === matches.length ? ['all known'] : [`${known} known`]),
    ...(count('respelt') > 0 ? [`${count('respelt')} respelt`] : []),
    ...(count('unknown') > 0 ? [`${count('unknown')} not known`] : []),
  ].join(', ');
}
