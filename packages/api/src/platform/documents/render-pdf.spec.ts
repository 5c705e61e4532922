import { ROWS } from './document-style.js';
import { addressLines, letterhead } from './letterhead.js';
import { renderPdf } from './render-pdf.js';

const shop = {
  name: 'Alder Court Cabinets',
  address: { street: '12 Mill Lane', street2: '', city: 'Alder', region: 'WI', postalCode: '54001' },
  phone: '555 0100',
  email: 'office@alder.test',
};

describe('documents', () => {
  it('typesets a PDF with fonts of its own', async () => {
    const head = letterhead(
      shop,
      'Estimate 318',
      ['Ines Calder'],
      [{ label: 'Valid until', value: 'Thu, Jan 14' }],
    );
    const table = {
      layout: ROWS,
      table: {
        widths: ['*', 60],
        body: [
          ['Item', 'Price'],
          ['“Oak” – ¾″ × 2½″', '$1,046.00'],
        ],
      },
    };
    const pdf = await renderPdf(
      'Estimate 318',
      shop.name,
      [...head, table],
      new Date('2026-01-04T12:00:00Z'),
    );
    expect(pdf.subarray(0, 5).toString()).toBe('%PDF-');
    const text = pdf.toString('latin1');
    expect(text).toContain('HankenGrotesk');
    expect(text).not.toContain('Helvetica');
  });

  it('reads no file that a text in the document names', async () => {
    await expect(renderPdf('x', 'y', [{ image: '/etc/passwd' }], new Date(0))).rejects.toThrow();
  });

  it('leaves out the empty parts of an address', () => {
    expect(addressLines(shop.address)).toEqual(['12 Mill Lane', 'Alder, WI 54001']);
    expect(addressLines({ street: '', street2: '', city: '', region: '', postalCode: '' })).toEqual([]);
  });
});
