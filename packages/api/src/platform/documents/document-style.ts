import type { CustomTableLayout, StyleDictionary } from 'pdfmake/interfaces.js';

/** The look of paper: ink on white, hairlines, one face for headings. Readable in black and white. */
export const INK = '#141B26';
export const QUIET = '#56606F';
export const HAIRLINE = '#D8DEE6';

export const DOCUMENT_STYLES: StyleDictionary = {
  shop: { font: 'Archivo', fontSize: 13 },
  title: { font: 'Archivo', fontSize: 20, lineHeight: 1.1 },
  heading: { font: 'Archivo', fontSize: 11, margin: [0, 14, 0, 4] },
  label: { color: QUIET, fontSize: 8.5 },
  small: { color: QUIET, fontSize: 8 },
  columnHead: { color: QUIET, fontSize: 8.5, bold: true },
  total: { fontSize: 11, bold: true },
};

/** Rows parted by hairlines, a rule under the head, no boxes. */
export const ROWS: CustomTableLayout = {
  hLineWidth: (index, node) =>
    index === 0 || index === node.table.body.length ? 0 : index === 1 ? 0.8 : 0.4,
  vLineWidth: () => 0,
  hLineColor: (index) => (index === 1 ? QUIET : HAIRLINE),
  paddingLeft: (index) => (index === 0 ? 0 : 6),
  paddingRight: (index, node) => (index === (node.table.widths?.length ?? 0) - 1 ? 0 : 6),
  paddingTop: () => 3.5,
  paddingBottom: () => 3.5,
};

/** Amounts under each other with a rule above the last. */
export const TOTALS: CustomTableLayout = {
  hLineWidth: (index, node) => (index === node.table.body.length - 1 ? 0.8 : 0),
  vLineWidth: () => 0,
  hLineColor: () => INK,
  paddingLeft: () => 0,
  paddingRight: () => 0,
  paddingTop: () => 3,
  paddingBottom: () => 3,
};
