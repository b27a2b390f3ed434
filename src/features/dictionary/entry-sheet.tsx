import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { paths } from '#src/app/paths.ts';
import { Panel } from '#src/ui/sheet.tsx';
import type { Entry } from './dictionary-room.tsx';
import './dictionary.css';

/** One ingredient: what it is called where, its numbers, what it does, and where that is read. */
export function EntrySheet({ entry }: { entry: Entry }) {
  const { names } = entry;
  return (
    <>
      <Panel title="Printed name" aside="by default; a house may choose a joined form">
        <dl className="entry max-w-[760px]">
          <Row word="EU"><span className="printed">{entry.inci}</span></Row>
          <Row word="UK"><span className="printed">{entry.inci}</span></Row>
          <Row word="US"><span className="printed">{names.us ?? entry.inci}</span>{names.usColours && names.usColours.length > 1 ? <List items={names.usColours} head="Several US names share this number; the material says which:" /> : null}</Row>
          <Row word="Canada"><span className="printed">{names.ca ?? entry.inci}</span>{names.fr ? <span className="quiet">, in French {names.fr}</span> : null}</Row>
        </dl>
      </Panel>
      <Panel title="What is known of it">
        <dl className="entry max-w-[760px]">
          <Row word="Functions">{entry.functions.join(', ')}</Row>
          <Row word="CAS">{entry.cas.join(', ')}</Row>
          <Row word="EC">{entry.ec.join(', ')}</Row>
          <Row word="Synonyms">{entry.synonyms.length > 0 ? <List items={entry.synonyms} /> : null}</Row>
          <Row word="Common names">{entry.commonNames.length > 0 ? <List items={entry.commonNames} /> : null}</Row>
          <Row word="Superseded by">{entry.supersededBy ? <Link to={paths.entry(entry.supersededBy)}>{entry.supersededBy}</Link> : null}</Row>
          <Row word="Kind">{entry.properties.map((one) => one.replaceAll('-', ' ')).join(', ')}</Row>
          <Row word="Read from">{entry.source}</Row>
        </dl>
      </Panel>
    </>
  );
}

function Row({ word, children }: { word: string; children: ReactNode }) {
  if (!children) return null;
  return <><dt>{word}</dt><dd>{children}</dd></>;
}
function List({ items, head }: { items: readonly string[]; head?: string }) {
  return <>{head ? <p className="quiet">{head}</p> : null}<ul>{items.map((item) => <li key={item}>{item}</li>)}</ul></>;
}
