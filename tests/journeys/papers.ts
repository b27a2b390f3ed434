/** Papers that suppliers send, made for the journeys. */
import { PDFDocument, StandardFonts } from 'pdf-lib';
import sharp from 'sharp';

export interface Paper {
  readonly name: string;
  readonly mimeType: string;
  readonly buffer: Buffer;
}

/** A supplier's sheet of one page. */
export async function makeSheet(words: string): Promise<Paper> {
  const document = await PDFDocument.create();
  const font = await document.embedFont(StandardFonts.Helvetica);
  document.addPage([400, 300]).drawText(words, { x: 40, y: 200, size: 14, font });
  return { name: 'composition sheet.pdf', mimeType: 'application/pdf', buffer: Buffer.from(await document.save()) };
}

/** A photo as a telephone takes it: lying on its side, with the place and the device written into it. */
export async function makePhoto(): Promise<Paper> {
  const buffer = await sharp({ create: { width: 640, height: 480, channels: 3, background: '#c9b38a' } })
    .jpeg()
    .withExif({ IFD0: { Make: 'Invented Camera Works', Model: 'K-7' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } })
    .toBuffer();
  return { name: 'allergens.jpg', mimeType: 'image/jpeg', buffer };
}

/** A text that calls itself a PDF. */
export const MISNAMED: Paper = { name: 'invoice.pdf', mimeType: 'application/pdf', buffer: Buffer.from('Dear house, please find the sheet attached.\n') };

/** A page with a program in it that calls itself a photo. */
export const HOSTILE: Paper = {
  name: '../../photo.png',
  mimeType: 'image/png',
  buffer: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>parent.document.title="taken"</script></svg>\n'),
};

/** One byte more than 20 MB, and a PDF by its first bytes. */
export function makeTooLarge(): Paper {
  const buffer = Buffer.alloc(20 * 1024 * 1024 + 1, 0x20);
  buffer.write('%PDF-1.4\n');
  return { name: 'everything.pdf', mimeType: 'application/pdf', buffer };
}
