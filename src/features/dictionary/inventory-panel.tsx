import { useEffect, useId, useState } from 'react';
import type { ChangeEvent } from 'react';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { InventoryState } from '#shared/contracts/inventory.contract.ts';
import { sayError } from '#src/lib/api/error.ts';
import { sayCount, sayWhen } from '#src/lib/say.ts';
import { Button } from '#src/ui/button.tsx';
import { FieldFault } from '#src/ui/field.tsx';
import { Progress } from '#src/ui/progress.tsx';
import { Panel } from '#src/ui/sheet.tsx';
import { TakeAwayDialog } from '#src/ui/take-away-dialog.tsx';
import { inventoryQuery, useImportInventory, useRemoveInventory } from './inventory-queries.ts';
import { dictionaryQueries } from './queries.ts';

type Last = NonNullable<InventoryState['last']>;
type Remark = Last['skipped'][number];

/** Taking over the official inventory: an owner sends the export; everyone sees how it stands. */
export function InventoryPanel({ isOwner }: { isOwner: boolean }) {
  const { data } = useQuery(inventoryQuery);
  const client = useQueryClient();
  const isRunning = data?.last?.isRunning === true;
  const done = data?.last?.done;
  useEffect(() => {
    if (!isRunning && done !== undefined) void client.invalidateQueries({ queryKey: dictionaryQueries.all });
  }, [client, isRunning, done]);
  if (!data || (!isOwner && !data.last)) return null;
  return (
    <Panel title="Names from the official inventory" aside="kept beside the curated ones, for this house alone">
      <p className="quiet max-w-[70ch]">They help to find and spell a name. Nobody here has checked them: a name from the inventory counts as unknown in verdicts until you have made sure of it.</p>
      {data.last ? <Report last={data.last} names={data.names} /> : null}
      {isOwner ? <Acts state={data} /> : null}
    </Panel>
  );
}

function Report({ last, names }: { last: Last; names: number }) {
  if (last.isRunning) {
    return (
      <div className="mt-3 max-w-[520px]">
        <p role="status">{last.done} of {last.total} names taken over from {last.fileName}. You may leave this page; the work goes on.</p>
        <Progress done={last.done} all={last.total} label="Names taken over" />
      </div>
    );
  }
  return (
    <div className="mt-3">
      <p role="status">{sayCount(names, 'name')} from the inventory. Last taken over: {last.fileName}, {sayWhen(last.startedAt)}, by {last.startedBy}.</p>
      <dl className="entry mt-2 max-w-[520px]">
        <dt>Added</dt><dd>{last.added}</dd>
        <dt>Updated</dt><dd>{last.updated}</dd>
        <dt>Unchanged</dt><dd>{last.unchanged}</dd>
        <dt>Curated already</dt><dd>{last.joined}</dd>
      </dl>
      <Remarks title="Lines left out" remarks={last.skipped} />
      <Remarks title="Numbers left out" remarks={last.remarks} />
    </div>
  );
}

function Remarks({ title, remarks }: { title: string; remarks: readonly Remark[] }) {
  if (remarks.length === 0) return null;
  return (
    <details className="mt-2">
      <summary>{title}: {remarks.length}</summary>
      <ul className="quiet max-h-60 overflow-auto">{remarks.map(({ line, reason }, index) => <li key={index}>Line {line}: {reason}</li>)}</ul>
    </details>
  );
}

function Acts({ state }: { state: InventoryState }) {
  const inputId = useId();
  const send = useImportInventory();
  const remove = useRemoveInventory();
  const [asks, setAsks] = useState(false);
  const take = (event: ChangeEvent<HTMLInputElement>) => {
    const file = event.target.files?.[0];
    event.target.value = '';
    if (file) send.mutate(file);
  };
  return (
    <div className="mt-3 flex flex-wrap items-center gap-3">
      {state.last?.isRunning ? null : (
        <>
          <label className="btn small" htmlFor={inputId}>{send.isPending ? 'Sending …' : state.last ? 'Take over a newer export' : 'Take over an export'}</label>
          <input id={inputId} type="file" className="sr-only" accept=".tsv,.csv,.txt,text/plain,text/csv" disabled={send.isPending} onChange={take} />
        </>
      )}
      {state.last ? <Button small onClick={() => setAsks(true)}>Remove the names</Button> : <span className="hint">The inventory as text, with tabs or commas, up to 20 MB.</span>}
      {send.error ? <FieldFault>{sayError(send.error)}</FieldFault> : null}
      {asks ? (
        <TakeAwayDialog title="Remove the names from the inventory" what={`${sayCount(state.names, 'name')} from the inventory will leave this house; curated names stay`} isBusy={remove.isPending} error={remove.error} onTakeAway={() => remove.mutate(undefined, { onSuccess: () => setAsks(false) })} onClose={() => setAsks(false)} />
      ) : null}
    </div>
  );
}
