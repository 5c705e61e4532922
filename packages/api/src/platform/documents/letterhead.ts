import type { Content } from 'pdfmake/interfaces.js';

export type PostalAddress = {
  street: string;
  street2: string;
  city: string;
  region: string;
  postalCode: string;
};
export type Sender = { name: string; address: PostalAddress; phone: string; email: string };
export type Fact = { label: string; value: string };

/** An address in the US postal habit, empty parts left out. */
export function addressLines(address: PostalAddress): string[] {
  const region = [address.region, address.postalCode].filter(Boolean).join(' ');
  return [address.street, address.street2, [address.city, region].filter(Boolean).join(', ')].filter(Boolean);
}

/** The head of a document: the shop at the left, what this is at the right, then who it is for and the facts. */
export function letterhead(
  sender: Sender,
  title: string,
  recipient: readonly string[],
  facts: readonly Fact[],
): Content[] {
  const shop = [...addressLines(sender.address), sender.phone, sender.email].filter(Boolean);
  return [
    {
      columns: [
        {
          width: '*',
          stack: [
            { text: sender.name, style: 'shop' },
            { text: shop.join('\n'), style: 'label', margin: [0, 2, 0, 0] },
          ],
        },
        { width: 'auto', text: title, style: 'title', alignment: 'right' },
      ],
      columnGap: 24,
    },
    {
      margin: [0, 26, 0, 18],
      columns: [
        { width: '*', text: recipient.filter(Boolean).join('\n') },
        {
          width: 'auto',
          table: {
            body: facts.map(({ label, value }) => [
              { text: label, style: 'label' },
              { text: value, alignment: 'right', margin: [12, 0, 0, 0] },
            ]),
          },
          layout: 'noBorders',
        },
      ],
      columnGap: 24,
    },
  ];
}
