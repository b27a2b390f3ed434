import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { getReportPdf, getWeighOutPdf } from '#shared/contracts/products.contract.ts';
import type { ReportModel } from '#shared/report/report-model.ts';
import { download } from '#src/lib/api/download.ts';
import { sayError } from '#src/lib/api/error.ts';
import { Button } from '#src/ui/button.tsx';
import { ReportPaper } from './report-paper.tsx';

export interface ReportScreenProps {
  readonly productId: string;
  readonly placed: string;
  readonly available: string;
  /** Builds the report from what is on the screen now, with or without exact shares. */
  readonly build: (showShares: boolean) => ReportModel;
  /** True while the draft holds changes that the server, which makes the PDF, does not have yet. */
  readonly isUnsaved: boolean;
}

/** The compliance report on screen, with its PDF and the weigh-out sheet. */
export function ReportScreen({ productId, placed, available, build, isUnsaved }: ReportScreenProps) {
  const [isHidden, setHidden] = useState(false);
  const model = build(!isHidden);
  const report = useMutation({
    mutationFn: () => download(getReportPdf, { params: { id: productId }, query: { placed, available, shares: isHidden ? 'hidden' : 'exact' } }),
  });
  const weighOut = useMutation({ mutationFn: () => download(getWeighOutPdf, { params: { id: productId }, query: {} }) });
  const failed = report.error ?? weighOut.error;
  return (
    <div className="report-desk">
      <div className="report-acts">
        <label className="check">
          <input type="checkbox" checked={isHidden} onChange={(event) => setHidden(event.target.checked)} />
          <span>For an outsider: bands instead of exact shares</span>
        </label>
        <span className="end">
          <Button busy={weighOut.isPending} onClick={() => weighOut.mutate()}>{weighOut.isPending ? 'Setting the sheet' : 'Weigh-out sheet'}</Button>
          <Button weight="act" busy={report.isPending} onClick={() => report.mutate()}>{report.isPending ? 'Setting the report' : 'Report for the file'}</Button>
        </span>
        {isUnsaved ? <p className="hint">The PDF is made from the saved product; the last change is still on its way.</p> : null}
        {failed ? <p className="error" role="alert"><i className="mark stop" aria-hidden="true" />{sayError(failed)}</p> : null}
      </div>
      <ReportPaper model={model} />
    </div>
  );
}
