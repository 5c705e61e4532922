import { createRequire } from 'node:module';
import pdfmake from 'pdfmake';
import type { TDocumentDefinitions } from 'pdfmake/interfaces.js';
import { DOCUMENT_STYLES, INK } from './document-style.js';

const fontFile = createRequire(import.meta.url).resolve;
const hanken = (folder: string, name: string) =>
  fontFile(`@expo-google-fonts/hanken-grotesk/${folder}/HankenGrotesk_${name}.ttf`);
const archivo = fontFile('@expo-google-fonts/archivo/600SemiBold/Archivo_600SemiBold.ttf');

pdfmake.setFonts({
  Hanken: {
    normal: hanken('400Regular', '400Regular'),
    bold: hanken('600SemiBold', '600SemiBold'),
    italics: hanken('400Regular_Italic', '400Regular_Italic'),
    bolditalics: hanken('600SemiBold_Italic', '600SemiBold_Italic'),
  },
  Archivo: { normal: archivo, bold: archivo, italics: archivo, bolditalics: archivo },
});
// Only our own font files are read from the disk, and nothing is fetched: a document's text is a customer's.
pdfmake.setLocalAccessPolicy((path: string) => path.includes('@expo-google-fonts'));
pdfmake.setUrlAccessPolicy(() => false);

/**
 * Typesets a document. Letter-size pages in the shop's country's habit, page numbers at the foot.
 *
 * @param title stands in the PDF's properties and its foot
 * @param author the shop's name
 */
export function renderPdf(
  title: string,
  author: string,
  content: TDocumentDefinitions['content'],
  now: Date,
): Promise<Buffer> {
  return pdfmake
    .createPdf({
      info: { title, author, creationDate: now, producer: 'Bookmatch', creator: author },
      pageSize: 'LETTER',
      pageMargins: [54, 54, 54, 60],
      defaultStyle: { font: 'Hanken', fontSize: 9.5, lineHeight: 1.25, color: INK },
      styles: DOCUMENT_STYLES,
      footer: (page, pages) => ({
        margin: [54, 18, 54, 0],
        style: 'small',
        columns: [{ text: `${author} · ${title}` }, { text: `Page ${page} of ${pages}`, alignment: 'right' }],
      }),
      content,
    })
    .getBuffer();
}
