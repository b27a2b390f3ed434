import { useQuery } from '@tanstack/react-query';
import { getLabelPdf } from '#shared/contracts/products.contract.ts';
import { picturesQuery } from '#src/features/labels/hand/pictures.ts';
import { LabelStudio } from '#src/features/labels/label-studio.tsx';
import { useProductPage } from '#src/features/workspace/product-page.ts';
import { download } from '#src/lib/api/download.ts';
import { sayError } from '#src/lib/api/error.ts';

/** The label at true size, its settings, and the press file. */
export function Component() {
  const { id, desk, live, house, asOf, isLabelLocked } = useProductPage();
  const { market } = desk.draft.label;
  const { data: pictures } = useQuery(picturesQuery);
  const result = live.all.get(market) ?? (live.view.result.market === market ? live.view.result : undefined);

  const fetchPressFile = async (): Promise<void> => {
    // The server sets what it holds, so what was typed last must have reached it.
    if (desk.save.kind !== 'saved') {
      desk.saveNow();
      throw new Error('The last change is on its way to the server. Ask again when it is saved.');
    }
    try {
      await download(getLabelPdf, { params: { id }, query: { market, placed: asOf.placed, available: asOf.available } });
    } catch (error) {
      throw new Error(sayError(error), { cause: error });
    }
  };

  return (
    <div className="wrap full">
      <LabelStudio
        draft={desk.draft} result={result} house={house} pictures={pictures} isLocked={isLabelLocked}
        onChange={(label, join = 'label') => desk.change((draft) => ({ ...draft, label }), join)}
        onPressFile={fetchPressFile}
      />
      <p className="foot">Screen and press file are painted from one scene.</p>
    </div>
  );
}
