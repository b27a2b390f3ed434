import { useId, useState } from 'react';
import type { Product } from '#shared/contracts/products.contract.ts';
import { ApiError, sayError } from '#src/lib/api/error.ts';
import { Banner } from '#src/ui/banner.tsx';
import { useImportProduct } from './mutations.ts';

const MOST_BYTES = 5 * 1024 * 1024;

/** A formula document from a file: the product and the materials it lacks are created. */
export function ImportDocument({ onCreated }: { onCreated: (product: Product) => void }) {
  const id = useId();
  const [fault, setFault] = useState('');
  const bring = useImportProduct();
  const read = async (file: File | undefined) => {
    if (!file) return;
    setFault('');
    bring.reset();
    if (file.size > MOST_BYTES) return setFault('A formula document is a few pages of text. This file is over 5 MB.');
    try {
      const document: unknown = JSON.parse(await file.text());
      bring.mutate(document, { onSuccess: onCreated });
    } catch {
      setFault(`${file.name} is not a formula document: it cannot be read as JSON.`);
    }
  };
  const issues = bring.error instanceof ApiError ? bring.error.issues : [];
  return (
    <div className="grid gap-3">
      <div>
        <label className="btn" htmlFor={id} aria-busy={bring.isPending || undefined}>{bring.isPending ? 'Being read' : 'Choose a file'}</label>
        <input id={id} type="file" accept=".json,application/json" className="sr-only" disabled={bring.isPending} onChange={(event) => { void read(event.target.files?.[0]); event.target.value = ''; }} />
      </div>
      {fault ? <Banner weight="stop" title="Not imported.">{fault}</Banner> : null}
      {bring.error ? (
        <Banner weight="stop" title="Not imported.">
          {sayError(bring.error)}
          {issues.length > 0 ? <ul className="mt-2">{issues.slice(0, 8).map((issue) => <li key={issue.pointer}><span className="quiet">{issue.pointer}</span> {issue.message}</li>)}</ul> : null}
        </Banner>
      ) : null}
    </div>
  );
}
