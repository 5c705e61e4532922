import { Decimal } from 'decimal.js';
import type { Address } from '../customers/customers-contract.js';
import { canonicalJson } from '../wire/canonical-json.js';
import { ACCEPTED_DOCUMENT_FORM, type AcceptedDocument } from './accepted-document-contract.js';
import { billScheduleSoFar } from './billing-schedule.js';
import { estimateTotals, priceRooms } from './estimate-totals.js';
import type { RevisionContent, RevisionRoom } from './revision-contract.js';

/** Everything the document says that is not in the revision itself. */
export type DocumentFrame = {
  shopName: string;
  customerName: string;
  site: { name: string; address: Address } | null;
  estimateNumber: number;
  revisionNumber: number;
  revisionId: string;
  title: string;
  currency: string;
};

/** The revision as its customer reads it. Made from the content alone, key by key, so that no cost slips in. */
export function acceptedDocument(frame: DocumentFrame, revision: RevisionContent): AcceptedDocument {
  const totals = estimateTotals(revision);
  return {
    form: ACCEPTED_DOCUMENT_FORM,
    shopName: frame.shopName,
    customerName: frame.customerName,
    site: frame.site && { name: frame.site.name, address: frame.site.address },
    estimateNumber: frame.estimateNumber,
    revisionNumber: frame.revisionNumber,
    revisionId: frame.revisionId,
    title: frame.title,
    currency: frame.currency,
    intro: revision.intro,
    rooms: priceRooms(revision.rooms).map(roomAsShown),
    subtotalCents: totals.subtotalCents,
    discountCents: totals.discountCents,
    netCents: totals.netCents,
    taxRule: revision.taxRule,
    taxRate: plain(revision.taxRate),
    taxableCents: totals.taxableCents,
    taxCents: totals.taxCents,
    totalCents: totals.totalCents,
    billingSchedule: billScheduleSoFar(revision.billingSchedule, totals).map((stage) => ({
      name: stage.name,
      deposit: stage.deposit,
      due: stage.due,
      netCents: stage.netCents,
      taxCents: stage.taxCents,
      totalCents: stage.totalCents,
    })),
    exclusions: revision.exclusions,
    terms: revision.terms,
    validUntil: revision.validUntil,
  };
}

/** The text whose SHA-256 is kept with an acceptance: equal documents give equal texts, whatever order their keys had. */
export function acceptedText(document: AcceptedDocument): string {
  return canonicalJson(document);
}

function roomAsShown(room: RevisionRoom): AcceptedDocument['rooms'][number] {
  return {
    name: room.name,
    lines: room.lines.map((line) => ({
      description: line.description,
      quantity: plain(line.quantity),
      unit: line.unit,
      unitPriceCents: line.unitPriceCents,
      amountCents: line.amountCents,
    })),
    amountCents: room.amountCents,
  };
}

/** A database gives `2.000` where a person typed `2`: the document says `2` both times. */
function plain(decimal: string): string {
  return new Decimal(decimal).toFixed();
}
