import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { exportTrail } from '#shared/contracts/trail.contract.ts';
import { download } from '#src/lib/api/download.ts';
import { sayError } from '#src/lib/api/error.ts';
import { Banner } from '#src/ui/banner.tsx';
import { Button } from '#src/ui/button.tsx';
import { verdictQuery } from './queries.ts';

/** Goes along the chain when asked, and hands the trail out. */
export function TrailSeal() {
  const { data, error, isFetching, refetch } = useQuery(verdictQuery);
  const [failure, setFailure] = useState('');
  return (
    <div className="trail-seal">
      <p className="quiet">Every entry is sealed to the one before it with SHA-256; entries are only ever added. Keep an export outside this house: against it even a cut-off end is found.</p>
      <p className="flex flex-wrap gap-2">
        <Button busy={isFetching} onClick={() => void refetch()}>Verify the chain</Button>
        <Button icon="download" onClick={() => { setFailure(''); download(exportTrail, {}).catch((fault: unknown) => setFailure(sayError(fault))); }}>Export the trail</Button>
      </p>
      <div role="status">
        {isFetching ? <p className="hint">Going along the chain.</p> : data?.isWhole ? <Banner weight="note" title="The chain is whole.">{data.entries} entries, the last sealed <code>{data.head.slice(0, 16)}</code>.</Banner> : null}
      </div>
      {data && !data.isWhole ? <Banner weight="stop" title={`The chain breaks at entry ${data.place}.`}>Entry {data.place} {data.why}. Compare with your last export and ask whoever runs the database.</Banner> : null}
      {error ?? failure ? <Banner weight="stop" title="That did not work.">{failure || sayError(error)}</Banner> : null}
    </div>
  );
}
