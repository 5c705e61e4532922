import type { Subject } from '@bookmatch/common/access/ability';
import { JOB_STAGE_NAMES } from '@bookmatch/common/jobs/job-stages';
import type { JobStage } from '@bookmatch/common/jobs/jobs-contract';
import { LEAD_STAGE_NAMES } from '@bookmatch/common/leads/lead-stages';
import type { LeadStage } from '@bookmatch/common/leads/leads-contract';
import type { FoundKind } from '@bookmatch/common/today/quick-find-contract';
import type { ShopQuery } from '../../platform/database/shop-query.js';
import type { ShopScope } from '../../platform/database/scope.js';
import { Customer } from '../customers/customers-public.js';
import { Estimate } from '../estimates/estimates-public.js';
import { Invoice } from '../invoices/invoices-public.js';
import { Job, onlyReadable } from '../jobs/jobs-public.js';
import { Lead } from '../leads/leads-public.js';

/** A found row as it is read: `facts` are what its line is made of, the first a state where there is one. */
export type StoredFound = {
  id: string;
  title: string;
  number: number | null;
  fact: string;
  otherFact: string | null;
};

/** How one kind of thing is looked for. Its query picks what a `StoredFound` has, and no money. */
export type FindableKind = {
  subject: Subject;
  query(scope: ShopScope): ShopQuery;
  /** Columns that a text may stand in; the first is the one that a name begins in. */
  texts: readonly [string, ...string[]];
  number?: string;
  newestFirst: string;
  line(row: StoredFound): string;
};

const joined = (...facts: (string | null)[]) => facts.filter(Boolean).join(' · ');

export const FINDABLE: Record<FoundKind, FindableKind> = {
  customer: {
    subject: 'Customer',
    query: (scope) =>
      scope.query(Customer, 'customer').pick({
        ...{ id: 'customer.id', title: 'customer.name', number: 'null' },
        ...{ fact: 'customer.company', otherFact: 'customer.city' },
      }),
    texts: ['customer.name', 'customer.company', 'customer.email', 'customer.phone'],
    newestFirst: 'customer.createdAt',
    line: ({ fact, otherFact }) => joined(fact, otherFact),
  },
  lead: {
    subject: 'Lead',
    query: (scope) =>
      scope.query(Lead, 'lead').pick({
        ...{ id: 'lead.id', title: 'lead.title', number: 'null' },
        ...{ fact: 'lead.stage', otherFact: 'lead.contactName' },
      }),
    texts: ['lead.title', 'lead.contactName', 'lead.company', 'lead.email', 'lead.phone'],
    newestFirst: 'lead.createdAt',
    line: ({ fact, otherFact }) => joined(otherFact, LEAD_STAGE_NAMES[fact as LeadStage]),
  },
  estimate: {
    subject: 'Estimate',
    query: (scope) =>
      scope
        .query(Estimate, 'estimate')
        .join(Customer, 'customer', 'customer.id = estimate.customerId')
        .pick({
          ...{ id: 'estimate.id', title: 'estimate.title', number: 'estimate.number' },
          ...{ fact: 'estimate.status', otherFact: 'customer.name' },
        }),
    texts: ['estimate.title', 'customer.name'],
    number: 'estimate.number',
    newestFirst: 'estimate.createdAt',
    line: ({ fact, otherFact }) => joined(otherFact, capitalized(fact)),
  },
  job: {
    subject: 'Job',
    query: (scope) => {
      const query = scope.query(Job, 'job').join(Customer, 'customer', 'customer.id = job.customerId');
      return onlyReadable(scope, query).pick({
        ...{ id: 'job.id', title: 'job.title', number: 'job.number' },
        ...{ fact: 'job.stage', otherFact: 'customer.name' },
      });
    },
    texts: ['job.title', 'customer.name'],
    number: 'job.number',
    newestFirst: 'job.createdAt',
    line: ({ fact, otherFact }) => joined(otherFact, JOB_STAGE_NAMES[fact as JobStage]),
  },
  invoice: {
    subject: 'Invoice',
    query: (scope) =>
      scope
        .query(Invoice, 'invoice')
        .join(Customer, 'customer', 'customer.id = invoice.customerId')
        .leftJoin(Job, 'job', 'job.id = invoice.jobId')
        .pick({
          ...{ id: 'invoice.id', title: 'customer.name', number: 'invoice.number' },
          ...{ fact: 'invoice.status', otherFact: 'job.title' },
        }),
    texts: ['customer.name', 'job.title'],
    number: 'invoice.number',
    newestFirst: 'invoice.createdAt',
    line: ({ fact, otherFact }) => joined(otherFact, capitalized(fact)),
  },
};

/** Stored states of estimates and invoices are the words shown, in small letters. */
const capitalized = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);
