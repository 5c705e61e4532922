import { customerSchema, siteSchema } from '../customers/customers-contract.js';
import { estimateSchema } from '../estimates/estimates-contract.js';
import { saveRevisionSchema } from '../estimates/revision-contract.js';
import { invoiceSchema } from '../invoices/invoices-contract.js';
import { jobSchema } from '../jobs/jobs-contract.js';
import { leadRowSchema, leadSchema } from '../leads/leads-contract.js';
import { memberSchema } from '../shops/members-contract.js';
import { timeEntrySchema } from '../time/time-contract.js';
import { buildCustomer, buildSite } from './build-customer.js';
import { buildEstimate, buildRevisionContent } from './build-estimate.js';
import { buildInvoice, buildInvoiceLine } from './build-invoice.js';
import { buildJob, buildJobMoney } from './build-job.js';
import { buildLead, buildLeadRow } from './build-lead.js';
import { buildMember } from './build-member.js';
import { buildTimeEntry } from './build-time-entry.js';
import { nextId, restartIds } from './ids.js';

describe('what is built', () => {
  it.each([
    ['a customer', customerSchema, buildCustomer()],
    ['a site', siteSchema, buildSite()],
    ['a member', memberSchema, buildMember({ laborCostCentsPerHour: 3_200 })],
    ['a lead', leadSchema, buildLead()],
    ['a lead on the board', leadRowSchema, buildLeadRow()],
    ['an estimate', estimateSchema, buildEstimate()],
    ['the content of a revision', saveRevisionSchema, buildRevisionContent()],
    ['a job', jobSchema, buildJob({ money: buildJobMoney() })],
    ['an invoice', invoiceSchema, buildInvoice()],
    ['a draft', invoiceSchema, buildInvoice({ status: 'draft' })],
    ['a time entry', timeEntrySchema, buildTimeEntry()],
    ['an open time entry', timeEntrySchema, buildTimeEntry({ endedAt: null })],
  ])('is valid: %s', (_, schema, built) => {
    expect(schema.parse(built)).toEqual(built);
  });

  it('comes to what the rules say of it', () => {
    const lines = [{ ...buildInvoiceLine({ quantity: '2', unitPriceCents: 5_000 }), amountCents: 10_000 }];
    expect(buildInvoice({ lines, paidCents: 825 }, '2027-01-27')).toMatchObject({
      totalCents: 10_825,
      balanceCents: 10_000,
      standing: 'overdue',
      daysOverdue: 2,
    });
    expect(buildTimeEntry()).toMatchObject({ minutes: 134 });
  });

  it('has the same ids once the count starts again', () => {
    restartIds();
    const first = [nextId(), nextId()];
    restartIds();
    expect([nextId(), nextId()]).toEqual(first);
  });
});
