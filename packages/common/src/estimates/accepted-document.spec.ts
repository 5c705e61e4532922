import { buildRevisionContent } from '../testing/build-estimate.js';
import { nextId } from '../testing/ids.js';
import { acceptedDocument, acceptedText } from './accepted-document.js';

describe('the document a customer accepts', () => {
  const frame = {
    shopName: 'Test shop',
    customerName: 'Wren Halloway',
    site: null,
    estimateNumber: 318,
    revisionNumber: 2,
    revisionId: nextId(),
    title: 'Library wall',
    currency: 'USD',
  };

  it('shows prices and no cost, hour or margin', () => {
    const text = acceptedText(acceptedDocument(frame, buildRevisionContent()));
    expect(text).toContain('"unitPriceCents":12400');
    expect(text).not.toMatch(/cost|minutes|margin|markup|operation|kind/i);
  });

  it('is one text however the database spells its decimals and orders its keys', () => {
    const content = buildRevisionContent();
    const stored = {
      ...Object.fromEntries(Object.entries(content).reverse()),
      taxRate: '0.082500',
      rooms: content.rooms.map((room) => ({
        ...room,
        lines: room.lines.map((line) => ({ ...line, quantity: '3.000' })),
      })),
    } as typeof content;
    expect(acceptedText(acceptedDocument(frame, stored))).toBe(
      acceptedText(acceptedDocument(frame, content)),
    );
  });

  it('is another text when any word or cent of it changes', () => {
    const content = buildRevisionContent();
    const text = acceptedText(acceptedDocument(frame, content));
    expect(acceptedText(acceptedDocument(frame, { ...content, terms: 'Half down.' }))).not.toBe(text);
    expect(acceptedText(acceptedDocument(frame, { ...content, discountCents: 1 }))).not.toBe(text);
  });
});
