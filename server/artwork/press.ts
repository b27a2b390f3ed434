import { PDFDict, PDFName, PDFRawStream, PDFString, type PDFContext, type PDFDocument, type PDFObject } from 'pdf-lib';
import { outputProfile } from './profile.ts';

export interface Press {
  readonly standard: 'PDF/X-1a:2003' | 'PDF/X-4';
  /** Name of a registered printing condition, or words for one of one's own. */
  readonly condition: string;
}
export const USUAL_PRESS: Press = { standard: 'PDF/X-1a:2003', condition: 'FOGRA39' };

/** Conditions of the ICC registry that printers name (names from memory). Others travel with a profile. */
const REGISTERED: Readonly<Record<string, string>> = {
  FOGRA39: 'Coated paper, offset, ISO 12647-2:2004',
  FOGRA51: 'Coated paper, offset, ISO 12647-2:2013',
  FOGRA52: 'Uncoated paper, offset, ISO 12647-2:2013',
  'CGATS TR 006': 'Coated paper, offset, United States',
  'CGATS21-2-CRPC6': 'Coated paper, premium, United States',
};

async function profileStream(context: PDFContext): Promise<PDFObject> {
  const profile = await outputProfile();
  const dict = context.obj({ N: 4, Alternate: 'DeviceCMYK', Filter: 'FlateDecode', Length: profile.deflated.length });
  return context.register(PDFRawStream.of(dict as PDFDict, profile.deflated));
}

/**
 * The one output intent. A registered condition needs no profile in PDF/X-1a; PDF/X-4 must
 * embed one, and so must a condition that no registry knows.
 */
export async function outputIntent(context: PDFContext, press: Press): Promise<PDFObject> {
  const words = REGISTERED[press.condition];
  const intent = context.obj({ Type: 'OutputIntent', S: 'GTS_PDFX' }) as PDFDict;
  const set = (key: string, text: string): void => intent.set(PDFName.of(key), PDFString.of(escaped(text)));
  set('OutputConditionIdentifier', words ? press.condition : 'Custom');
  set('OutputCondition', words ?? press.condition);
  set('Info', words ?? press.condition);
  if (words) set('RegistryName', 'http://www.color.org');
  if (!words || press.standard === 'PDF/X-4') intent.set(PDFName.of('DestOutputProfile'), await profileStream(context));
  return context.register(intent);
}

/** Plain text for a PDF literal string: Latin letters only, brackets and strokes escaped. */
function escaped(text: string): string {
  return text.replace(/[^\x20-\x7e]/g, '?').replace(/[\\()]/g, (char) => `\\${char}`);
}

interface Facts {
  readonly press: Press;
  readonly title: string;
  readonly creator: string;
  readonly date: string;
  readonly hash: string;
}

/** The keys by which each standard is known: in the information for X-1a, in the metadata for X-4. */
export function standardKeys(doc: PDFDocument, facts: Facts): void {
  const { context } = doc;
  const info = context.lookup(context.trailerInfo.Info, PDFDict);
  info.set(PDFName.of('Trapped'), PDFName.of('False'));
  if (facts.press.standard === 'PDF/X-1a:2003') {
    info.set(PDFName.of('GTS_PDFXVersion'), PDFString.of('PDF/X-1a:2003'));
    return;
  }
  const packet = new TextEncoder().encode(metadata(facts));
  const dict = context.obj({ Type: 'Metadata', Subtype: 'XML', Length: packet.length });
  doc.catalog.set(PDFName.of('Metadata'), context.register(PDFRawStream.of(dict as PDFDict, packet)));
}

const xml = (text: string): string => text.replace(/[&<>"]/g, (char) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[char]!);

/** An identifier of the right form out of the content's hash: no clock, no chance. */
function uuid(hash: string): string {
  return `uuid:${hash.slice(0, 8)}-${hash.slice(8, 12)}-5${hash.slice(13, 16)}-8${hash.slice(17, 20)}-${hash.slice(20, 32)}`;
}

function metadata({ title, creator, date, hash }: Facts): string {
  const at = `${date}T00:00:00Z`;
  return `<?xpacket begin="\uFEFF" id="W5M0MpCehiHzreSzNTczkc9d"?>
<x:xmpmeta xmlns:x="adobe:ns:meta/"><rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#"><rdf:Description rdf:about=""
 xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:xmp="http://ns.adobe.com/xap/1.0/" xmlns:xmpMM="http://ns.adobe.com/xap/1.0/mm/"
 xmlns:pdf="http://ns.adobe.com/pdf/1.3/" xmlns:pdfxid="http://www.npes.org/pdfx/ns/id/">
<pdfxid:GTS_PDFXVersion>PDF/X-4</pdfxid:GTS_PDFXVersion><pdf:Trapped>False</pdf:Trapped><pdf:Producer>Colophon</pdf:Producer>
<dc:format>application/pdf</dc:format><dc:title><rdf:Alt><rdf:li xml:lang="x-default">${xml(title)}</rdf:li></rdf:Alt></dc:title>
<xmp:CreatorTool>${xml(creator)}</xmp:CreatorTool><xmp:CreateDate>${at}</xmp:CreateDate><xmp:ModifyDate>${at}</xmp:ModifyDate><xmp:MetadataDate>${at}</xmp:MetadataDate>
<xmpMM:DocumentID>${uuid(hash)}</xmpMM:DocumentID><xmpMM:InstanceID>${uuid(hash)}</xmpMM:InstanceID><xmpMM:VersionID>1</xmpMM:VersionID><xmpMM:RenditionClass>default</xmpMM:RenditionClass>
</rdf:Description></rdf:RDF></x:xmpmeta>
<?xpacket end="r"?>`;
}
