import type { ReportModel } from '#shared/report/report-model.ts';
import { INK_2, AMBER, STOP, openPaper, LEFT } from './paper.ts';
import { paragraph, setSections, type Section } from './flow.ts';
import { declaration, ladder, tally, verdict } from './report-pieces.ts';
import { formulaHead, formulaTable, particularsTable, signOff } from './tables.ts';

/**
 * The compliance report as an A4 PDF, text as text in embedded faces, equal bytes for equal input.
 * @param contentHash SHA-256, in hex, of the formula and result that the report speaks of.
 * @param day the day the report is made, `YYYY-MM-DD`.
 */
export async function renderReportPdf(model: ReportModel, contentHash: string, day: string): Promise<Uint8Array> {
  const paper = await openPaper({
    title: `${model.name}: report`,
    kind: 'report',
    house: model.house,
    foot: model.dataRelease,
    contentHash,
    day,
  });
  const sheet = paper.addSheet();
  const bold = { face: 'SemiBold', size: 34 } as const;
  const nameLines = paper.wrap(model.name, 178, bold);
  nameLines.forEach((line, index) => sheet.text(LEFT - 0.5, 35.6 + index * 10.6, line, bold));
  const nameFoot = 35.6 + (nameLines.length - 1) * 10.6;
  const subLines = paper.wrap(model.subtitle, 178, { size: 15 });
  subLines.forEach((line, index) => sheet.text(LEFT, nameFoot + 6.6 + index * 5.3, line, { size: 15, color: INK_2 }));

  const verdictSection = (weight: 'stop' | 'decide' | 'note', head: string): Section => ({
    head,
    headType: weight === 'stop' ? { color: STOP } : weight === 'decide' ? { color: AMBER } : { color: INK_2 },
    note: weight === 'note' ? '' : 'What to do, why, the arithmetic, the citation',
    pieces: model.verdicts[weight].map((finding) => verdict(paper, finding)),
  });
  const wording = model.requiredWording.map((item) =>
    paragraph(paper, `${item.market}, ${item.lang}: ${item.isOfficialText ? `“${item.text}”` : item.text}  ${item.citation}`),
  );
  setSections(paper, sheet, nameFoot + 6.6 + subLines.length * 5.3 - 0.5, [
    { head: 'Finding', pieces: [tally(paper, model), paragraph(paper, model.finding, { type: { size: 13 }, after: 0.5 })] },
    { head: 'Declaration', pieces: model.declarations.map((entry) => declaration(paper, entry)) },
    verdictSection('stop', 'Stops sale'),
    verdictSection('decide', 'Needs a decision'),
    verdictSection('note', 'Worth knowing'),
    { head: 'Required wording', note: 'As the law prints it', pieces: wording },
    ...(model.ladder ? [{ head: 'Concentration ladder', note: model.ladder.note, pieces: [ladder(paper, model.ladder)] }] : []),
    { head: 'Formula', note: model.formula.basis, pieces: formulaTable(paper, model.formula), repeats: formulaHead(paper, model.formula) },
    { head: 'Particulars', note: model.markets.join(', '), pieces: particularsTable(paper, model.particulars) },
    { head: 'Not checked', pieces: model.notChecked.map((text) => paragraph(paper, text, { after: 1.2 })) },
    { head: 'Law read', pieces: [paragraph(paper, `Data: ${model.dataRelease}. The law was read on ${model.lawReadOn}.`, { after: 0 })] },
    { head: 'Cautions', pieces: model.cautions.map((text) => paragraph(paper, text)) },
    { head: 'Sign-off', note: 'Whoever prepared the formula does not release it', pieces: [signOff()] },
  ]);
  return paper.close();
}
