import type { Express } from 'express';
import type Stripe from 'stripe';
import { createApp } from './app.js';
import { accountsOutbox } from './features/accounts/accounts-outbox.js';
import { accountsRoutes } from './features/accounts/accounts-routes.js';
import { AccountsService } from './features/accounts/accounts-service.js';
import { passwordsRoutes } from './features/accounts/passwords-routes.js';
import { PasswordsService } from './features/accounts/passwords-service.js';
import { sessionsRoutes } from './features/accounts/sessions-routes.js';
import { customerPageRoutes } from './features/customer-page/customer-page-routes.js';
import { CustomerLinks } from './features/customer-page/customer-links.js';
import { invoicePageRoutes } from './features/customer-page/invoice-page-routes.js';
import { linksRoutes } from './features/customer-page/links-routes.js';
import { customersRoutes } from './features/customers/customers-routes.js';
import { CustomersService } from './features/customers/customers-service.js';
import {
  customerEstimate,
  customerOfEstimate,
  EstimateAnswers,
  EstimateQuestions,
  EstimatesService,
  estimatesOfLead,
  type EstimateHooks,
} from './features/estimates/estimates-public.js';
import { estimatePdf } from './features/estimates/estimate-pdf.js';
import { EstimateSending } from './features/estimates/estimate-sending.js';
import { estimatesRoutes } from './features/estimates/estimates-routes.js';
import {
  createInvoiceServices,
  creditNoteDocument,
  customerInvoice,
  customerOfInvoice,
  earnDeposits,
  invoiceDocument,
  invoicesOutbox,
  invoicesPaymentEvents,
  jobInvoices,
  receiptDocument,
  type InvoiceServices,
} from './features/invoices/invoices-public.js';
import { invoicesRoutes } from './features/invoices/invoices-routes.js';
import { paymentsRoutes } from './features/invoices/payments-routes.js';
import { createLeadServices, type LeadServices } from './features/leads/lead-services.js';
import { markWon } from './features/leads/leads-public.js';
import { leadsRoutes } from './features/leads/leads-routes.js';
import { JobCostsService } from './features/jobs/job-costs-service.js';
import { jobCostsRoutes } from './features/jobs/job-costs-routes.js';
import { JOB_FILE_SWEEP, JobFilesService } from './features/jobs/job-files-service.js';
import { jobFilesRoutes } from './features/jobs/job-files-routes.js';
import {
  createJobFromAcceptance,
  jobOfEstimate,
  JobsService,
  type JobsParts,
} from './features/jobs/jobs-public.js';
import { jobsRoutes } from './features/jobs/jobs-routes.js';
import { ledgerRoutes } from './features/ledger/ledger-routes.js';
import { cardPaymentsEvents } from './features/shops/card-payments-service.js';
import { cardPaymentsRoutes } from './features/shops/card-payments-routes.js';
import { acceptanceRoutes, invitationsRoutes } from './features/shops/invitations-routes.js';
import { membersRoutes } from './features/shops/members-routes.js';
import { operationsRoutes } from './features/shops/operations-routes.js';
import { OperationsService } from './features/shops/operations-service.js';
import { createShopServices, type ShopServices } from './features/shops/shop-services.js';
import { shopSettingsRoutes } from './features/shops/shop-settings-routes.js';
import { createShop, shopOf, todayAt } from './features/shops/shops-public.js';
import { memberAccess, membershipsOf, refuseLapsed } from './features/subscription/member-access.js';
import { subscriptionEvents, subscriptionOutbox } from './features/subscription/subscription-events.js';
import { subscriptionRoutes } from './features/subscription/subscription-routes.js';
import {
  createSubscriptionServices,
  type SubscriptionServices,
} from './features/subscription/subscription-services.js';
import { followMembersLater } from './features/subscription/subscription-sync.js';
import { startTrial } from './features/subscription/trial.js';
import { clockedTime, clockOutLeaver, ClockService, EntriesService } from './features/time/time-public.js';
import { timeRoutes } from './features/time/time-routes.js';
import { todayRoutes } from './features/today/today-routes.js';
import type { ShopScope } from './platform/database/scope.js';
import type { Access } from './platform/http/mount.js';
import type { Route } from './platform/http/route.js';
import { tryLimits } from './platform/http/try-limits.js';
import { createUploadReader } from './platform/http/uploads.js';
import {
  MAIL,
  Mailer,
  type DocumentMaker,
  type DocumentRef,
  type Letter,
  type RenderedDocument,
} from './platform/mail/mail.js';
import { OutboxWorker } from './platform/outbox/outbox.js';
import { PAYMENT_EVENT, paymentsWebhook, type PaymentEventHandler } from './platform/payments/webhook.js';
import type { Platform } from './platform/platform.js';
import { sessionOf } from './platform/sessions/session-control.js';

export type Product = {
  app: Express;
  routes: readonly Route[];
  outbox: OutboxWorker;
  services: Services;
  /** False makes the readiness route say no: the process is about to stop. */
  setOpen(open: boolean): void;
  close(): Promise<void>;
};
export type Services = ShopServices &
  SubscriptionServices &
  LeadServices & {
    accounts: AccountsService;
    passwords: PasswordsService;
    customers: CustomersService;
    links: CustomerLinks;
    estimates: EstimatesService;
    sending: EstimateSending;
    questions: EstimateQuestions;
    answers: EstimateAnswers;
    operations: OperationsService;
    jobs: JobsService;
    jobCosts: JobCostsService;
    jobFiles: JobFilesService;
    invoices: InvoiceServices;
    clock: ClockService;
    timeEntries: EntriesService;
  };

/** Wires everything. The only place that knows which service needs which. */
export function compose(platform: Platform): Product {
  const services = createServices(platform);
  const routes = createRoutes(services, platform);
  const mailer = new Mailer(platform.config.mail, documentMaker(documentMakers(platform)));
  const outbox = new OutboxWorker(
    platform.dataSource,
    {
      ...outboxHandlers(mailer, {
        platform: subscriptionEvents({ ...services, ...platform }),
        connected: {
          ...invoicesPaymentEvents(services.invoices),
          ...cardPaymentsEvents(services.cardPayments),
        },
      }),
      ...invoicesOutbox(services.invoices),
      ...accountsOutbox({ ...services, ...platform }),
      ...subscriptionOutbox({ ...services, ...platform }),
      ...jobsOutbox(services, platform),
    },
    platform.clock,
    platform.log,
  );
  platform.work.onCommit(() => outbox.wake());
  let open = false;

  const app = createApp({
    ...platform,
    routes,
    isOpen: () => open,
    webhook: paymentsWebhook({ ...platform, secret: platform.config.payments.webhookSecret }),
    mount: { ...platform, access: createAccess(platform, services), uploads: createUploadReader() },
  });
  return {
    app,
    routes,
    outbox,
    services,
    setOpen: (value) => {
      open = value;
    },
    async close() {
      await outbox.stop();
      mailer.close();
    },
  };
}

function createServices(platform: Platform): Services {
  const { config, files } = platform;
  const accounts = new AccountsService(config.origin, {
    async createShop(scope, personId, input) {
      const shopId = await createShop(scope, personId, input);
      await startTrial(scope.forShop(shopId));
      return shopId;
    },
    membershipsOf,
  });
  return {
    accounts,
    passwords: new PasswordsService(config.origin),
    ...createShopServices(platform, {
      membersChanged: followMembersLater,
      memberLeaves: clockOutLeaver,
      refuseLapsed,
    }),
    ...createSubscriptionServices(platform),
    ...createSalesServices(platform),
    operations: new OperationsService(),
    jobs: new JobsService(JOBS_PARTS),
    jobCosts: new JobCostsService(),
    jobFiles: new JobFilesService(files),
    clock: new ClockService(),
    timeEntries: new EntriesService(),
  };
}

/** What jobs ask of the slices above them. */
const JOBS_PARTS: JobsParts = {
  time: clockedTime,
  billing: jobInvoices,
  onClosed: async (scope, job) => earnDeposits(scope, job.id, todayAt(await shopOf(scope), scope.now)),
};

/** From the inquiry to the accepted estimate. */
function createSalesServices(platform: Platform) {
  const customers = new CustomersService();
  const selling = createEstimateServices(platform);
  const leads = createLeadServices(customers, {
    startEstimate: async (scope, estimate) => (await selling.estimates.create(scope, estimate)).id,
    estimatesOf: estimatesOfLead,
  });
  return { customers, ...leads, ...selling };
}

function createEstimateServices(platform: Platform) {
  const { config } = platform;
  const links = new CustomerLinks(config, { estimate: customerOfEstimate, invoice: customerOfInvoice });
  const invoices = createInvoiceServices(platform, (scope, { id, customerId }) =>
    links.addressFor(scope, { subject: 'invoice', subjectId: id, customerId }),
  );
  const hooks: EstimateHooks = {
    linkTo: (scope, { id, customerId }) =>
      links.addressFor(scope, { subject: 'estimate', subjectId: id, customerId }),
    jobOf: jobOfEstimate,
    async onAccepted(scope, accepted) {
      const { leadId } = accepted.estimate;
      if (leadId !== null) await markWon(scope, leadId);
      const job = await createJobFromAcceptance(scope, accepted);
      await invoices.drafts.draftDueOnAcceptance(scope, job.id);
    },
  };
  return {
    links,
    invoices,
    estimates: new EstimatesService(hooks),
    sending: new EstimateSending(hooks),
    questions: new EstimateQuestions(config.origin, hooks),
    answers: new EstimateAnswers(config.origin, hooks),
  };
}

function createRoutes(services: Services, { sessions }: Platform): Route[] {
  return [
    ...accountsRoutes(services.accounts),
    ...sessionsRoutes(services.accounts, sessions),
    ...passwordsRoutes(services.passwords),
    ...shopSettingsRoutes(services.settings),
    ...membersRoutes(services.members),
    ...invitationsRoutes(services.invitations),
    ...acceptanceRoutes(services.acceptance, (scope, personId) => services.accounts.session(scope, personId)),
    ...cardPaymentsRoutes(services.cardPayments),
    ...subscriptionRoutes(services.subscription),
    ...customersRoutes(services.customers),
    ...leadsRoutes(services),
    ...estimatesRoutes(services),
    ...operationsRoutes(services.operations),
    ...jobsRoutes(services.jobs, JOBS_PARTS.time),
    ...jobCostsRoutes(services.jobCosts),
    ...jobFilesRoutes(services.jobFiles),
    ...timeRoutes(services),
    ...linksRoutes(services.links),
    ...customerPageRoutes({
      ...services,
      readers: { estimate: customerEstimate, invoice: customerInvoice },
    }),
    ...invoicePageRoutes({ links: services.links, cards: services.invoices.cards }),
    ...invoicesRoutes(services.invoices),
    ...paymentsRoutes(services.invoices),
    ...ledgerRoutes(),
    ...todayRoutes(),
  ];
}

function createAccess(platform: Platform, { links }: Services): Access {
  const { limits, sessions } = platform;
  return {
    member: memberAccess,
    async link(scope, token, address) {
      await limits.count('link-address', address);
      return links.resolve(scope, token);
    },
    sessionOf: (request) => sessionOf(request, sessions),
    ...tryLimits(limits, (request) => request.session.personId ?? null),
  };
}

/** How each kind of document is made when the letter that carries it is sent. */
function documentMakers({ work, clock }: Platform): Record<string, DocumentMaker> {
  const inShop = (make: (scope: ShopScope, id: string) => Promise<RenderedDocument>): DocumentMaker => {
    const stamp = () => ({ author: { kind: 'system' as const }, requestId: 'outbox', now: clock() });
    return ({ shopId, id }) => work.read(stamp(), (scope) => make(scope.forShop(shopId), id));
  };
  return {
    estimate: inShop(estimatePdf),
    invoice: inShop(invoiceDocument),
    'credit-note': inShop(creditNoteDocument),
    'payment-receipt': inShop(receiptDocument),
  };
}

/** Documents by kind, for the letters that carry them. */
function documentMaker(makers: Record<string, DocumentMaker>): DocumentMaker {
  return (ref: DocumentRef) => {
    const make = makers[ref.kind];
    if (!make) throw new TypeError(`There is no document of kind ${ref.kind}.`);
    return make(ref);
  };
}

function jobsOutbox({ jobFiles }: Services, { work, clock }: Platform) {
  return {
    [JOB_FILE_SWEEP]: (sweep: { fileId: string }, message: { id: string; shopId: string | null }) =>
      jobFiles.sweep(work, clock(), sweep, message),
  };
}

/** What is done about the provider's events: those of our own account, and those of shops' connected accounts. */
type PaymentEvents = Record<'platform' | 'connected', Record<string, PaymentEventHandler>>;

function outboxHandlers(mailer: Mailer, on: PaymentEvents) {
  return {
    [MAIL]: (letter: Letter, message: { id: string }) => mailer.send(letter, message.id),
    [PAYMENT_EVENT]: async (event: Stripe.Event) => {
      // Types we did not ask for are taken in and let go.
      await on[event.account ? 'connected' : 'platform'][event.type]?.(event);
    },
  };
}
