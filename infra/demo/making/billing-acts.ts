import type { Generator } from '../chance/generator.js';
import type { Milestones } from '../crew/job-progress.js';
import type { PlannedPayment, StageBilling } from '../plan/billing.js';
import type { Project } from '../plan/project.js';
import type { SmallBill } from '../plan/small-bills.js';
import { customerFor } from './customer-maker.js';
import { InvoiceMaker } from './invoice-maker.js';
import type { Telling } from './telling.js';

const REMINDER = 'This one may have slipped through. If it is on its way, please pay no heed to this letter.';

/** The invoices of a job: issued stage by stage, reminded of, credited, paid. */
export function billJob(
  telling: Telling,
  project: Project,
  stages: readonly StageBilling[],
  random: Generator,
): void {
  const { desk, trail, list, cast } = telling;
  const { email } = project.contact;
  for (const { stage, issuedOn, remindedOn, credit, payments } of stages) {
    if (issuedOn === null) continue;
    const invoice = new InvoiceMaker(desk, trail, `invoice ${stage} of ${project.key}`);
    list.add(issuedOn, 11, cast.bookkeeper, async (scope) => {
      await invoice.draftStage(scope, trail.id(project.key), stage);
      await invoice.issue(scope, email);
    });
    for (const day of remindedOn)
      list.add(day, 14, cast.bookkeeper, (scope) => invoice.send(scope, email, REMINDER));
    if (credit)
      list.add(credit.on, 15, cast.bookkeeper, (scope) => invoice.credit(scope, credit.reason, credit.cents));
    payments.forEach((payment, index) => pay(telling, invoice, payment, random.stream(`${stage} ${index}`)));
  }
}

/** Work beside the contract, agreed on site and billed by itself. */
export function billExtraWork(
  telling: Telling,
  project: Project,
  { installingOn }: Milestones,
  random: Generator,
): void {
  if (!project.turns.includes('extra-work') || installingOn === null) return;
  const { desk, trail, list, cast } = telling;
  const contact = project.contact;
  const invoice = new InvoiceMaker(desk, trail, `extra work of ${project.key}`);
  list.add(installingOn + 1, 13, cast.bookkeeper, async (scope) => {
    const { customerId } = await customerFor(scope, desk.services, trail, contact);
    await invoice.draftLines(scope, {
      ...{ customerId, jobId: trail.id(project.key), memo: 'As agreed on site with the customer.' },
      ...linesOf(
        () => scope.newId(),
        [
          ['Scribe and filler at the out-of-plumb wall', String(random.whole(3, 7)), 94, false],
          ['Panel stock for it', '1', random.whole(60, 140), true],
        ],
      ),
    });
    await invoice.issue(scope, contact.email);
  });
  pay(telling, invoice, { on: installingOn + random.whole(6, 12), share: 1, by: 'check' }, random);
}

/** A repair or a small piece, from the draft to the money. */
export function billSmall(telling: Telling, name: string, bill: SmallBill, random: Generator): void {
  const { desk, trail, list, cast } = telling;
  const { contact, issuedOn, writtenOn, lines, paid, creditedWhole } = bill;
  const invoice = new InvoiceMaker(desk, trail, name);
  list.add(writtenOn, 9, cast.bookkeeper, async (scope) => {
    const { customerId } = await customerFor(scope, desk.services, trail, contact);
    await invoice.draftLines(scope, { customerId, memo: '', ...linesOf(() => scope.newId(), lines) });
  });
  list.add(issuedOn, 10, cast.bookkeeper, (scope) => invoice.issue(scope, contact.email));
  if (paid) pay(telling, invoice, { ...paid, share: 1 }, random);
  if (creditedWhole)
    list.add(creditedWhole.on, 15, cast.bookkeeper, (scope) => invoice.credit(scope, creditedWhole.reason));
}

function pay(
  { list, when, cast }: Telling,
  invoice: InvoiceMaker,
  payment: PlannedPayment,
  random: Generator,
): void {
  const { on, share, by, returnedOn } = payment;
  if (by === 'card') {
    list.addAlone(on, 20, (at) => invoice.payByCard({ reader: cast.bookkeeper, at }));
    return;
  }
  const reference = referenceOf(by, random);
  list.add(on, 15, cast.bookkeeper, (scope) =>
    invoice.receive(scope, { by, share, on: when.date(on), reference }),
  );
  if (returnedOn !== undefined)
    list.add(returnedOn, 9, cast.bookkeeper, (scope) =>
      invoice.takeBack(scope, 'The bank returned the check.'),
    );
}

function referenceOf(by: PlannedPayment['by'], random: Generator): string {
  if (by === 'check') return `Check ${random.whole(1040, 8990)}`;
  return by === 'transfer' ? `Transfer ${random.whole(100_000, 999_999)}` : '';
}

function linesOf(newId: () => string, lines: SmallBill['lines']) {
  return {
    taxRate: '0.0725',
    lines: lines.map(([description, quantity, dollars, taxable]) => ({
      ...{ id: newId(), description, quantity, taxable },
      unitPriceCents: dollars * 100,
    })),
  };
}
