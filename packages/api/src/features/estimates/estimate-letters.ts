import { formatDate } from '@bookmatch/common/calendar/format';
import { formatMoney } from '@bookmatch/common/money/format';
import type { Letter } from '../../platform/mail/mail.js';
import type { Shop } from '../shops/shops-public.js';
import type { Estimate } from './estimate.entity.js';
import type { EstimateRevision } from './estimate-revision.entity.js';

/** A letter without its address. */
type Sheet = Omit<Letter, 'to'>;

/** What a customer did, told to the shop. */
export type ShopNews = {
  subject: (estimate: string) => string;
  heading: string;
  paragraphs: readonly string[];
};

export const questionLetter = (body: string): ShopNews => ({
  subject: (estimate) => `A question about ${estimate}`,
  heading: 'A customer asks',
  paragraphs: [body, 'Answer on the estimate’s page. The answer goes to the customer by e-mail.'],
});

export const acceptedNews = (name: string, price: string): ShopNews => ({
  subject: (estimate) => `Accepted: ${estimate}`,
  heading: 'The estimate was accepted',
  paragraphs: [`${name} accepted it at ${price}.`, 'A job was made of it, with what was planned.'],
});

export const declinedNews = (reason: string): ShopNews => ({
  subject: (estimate) => `Declined: ${estimate}`,
  heading: 'The estimate was declined',
  paragraphs: [reason === '' ? 'The customer gave no reason.' : `The customer wrote:\n${reason}`],
});

export function letterAboutEstimate(
  { number, title }: Estimate,
  customerName: string,
  url: string,
  { subject, heading, paragraphs }: ShopNews,
): Sheet {
  return {
    fromName: 'Bookmatch',
    subject: subject(`estimate ${number}, ${title}`),
    content: {
      heading,
      paragraphs: [`Estimate ${number}, ${title}, for ${customerName}.`, ...paragraphs],
      action: { label: 'Open the estimate', url },
      footer: 'You get this because you write estimates in this shop.',
    },
  };
}

/** The letter that brings the customer the estimate. */
export function estimateLetter(
  shop: Shop,
  { number, title }: Estimate,
  revision: EstimateRevision,
  { message, url }: { message: string; url: string },
): Sheet {
  return {
    ...fromShop(shop),
    subject: `Estimate ${number} from ${shop.name}: ${title}`,
    content: {
      heading: title,
      paragraphs: [
        ...(message === '' ? [] : [message]),
        `Your estimate comes to ${priceWords(revision, shop)}. It is valid until ${formatDate(revision.validUntil)}.`,
        'Read it, ask about it or accept it on its page. The same estimate is attached as a PDF.',
      ],
      action: { label: 'Open the estimate', url },
      footer: footerOf(
        shop,
        'The link opens your estimate without a password, so pass it on only to people who may.',
      ),
    },
    attachments: [{ kind: 'estimate', shopId: shop.id, id: revision.id }],
  };
}

export function answerLetter(
  shop: Shop,
  { number, title }: Estimate,
  { body, answer, url }: { body: string; answer: string; url: string },
): Sheet {
  return {
    ...fromShop(shop),
    subject: `Your question about estimate ${number}, ${title}`,
    content: {
      heading: `${shop.name} answered your question`,
      paragraphs: [`You asked:\n${body}`, answer],
      action: { label: 'Open the estimate', url },
      footer: footerOf(shop, 'You get this because you asked a question on the page of an estimate.'),
    },
  };
}

/** Confirms to the customer what they accepted, with the accepted pages attached. */
export function thanksLetter(
  shop: Shop,
  { number, title }: Estimate,
  revision: EstimateRevision,
  name: string,
): Sheet {
  return {
    ...fromShop(shop),
    subject: `You accepted estimate ${number}, ${title}`,
    content: {
      heading: `Thank you, ${name}`,
      paragraphs: [
        `You accepted estimate ${number}, ${title}, at ${priceWords(revision, shop)}. What you accepted is attached.`,
        `${shop.name} will be in touch about the next step.`,
      ],
      footer: footerOf(shop, 'You get this because the estimate was accepted on its page.'),
    },
    attachments: [{ kind: 'estimate', shopId: shop.id, id: revision.id }],
  };
}

/** Money is never ambiguous: the tax is said to be in the price, or that there is none. */
function priceWords({ totalCents, taxCents }: EstimateRevision, { currency }: Shop): string {
  const tax = taxCents === 0 ? 'no sales tax added' : `${formatMoney(taxCents, currency)} sales tax included`;
  return `${formatMoney(totalCents, currency)}, ${tax}`;
}

function fromShop(shop: Shop): Pick<Sheet, 'fromName' | 'replyTo'> {
  return { fromName: shop.name, ...(shop.email === '' ? {} : { replyTo: shop.email }) };
}

function footerOf(shop: Shop, why: string): string {
  const contact = [shop.phone, shop.email].filter(Boolean).join(', ');
  return [contact === '' ? shop.name : `${shop.name}, ${contact}`, why].join('\n');
}
