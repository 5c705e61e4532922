import type { Express } from 'express';
import type Stripe from 'stripe';
import { createApp } from './app.js';
import { accountsOutbox } from './features/accounts/accounts-outbox.js';
import { accountsRoutes } from './features/accounts/accounts-routes.js';
import { AccountsService } from './features/accounts/accounts-service.js';
import { passwordsRoutes } from './features/accounts/passwords-routes.js';
import { PasswordsService } from './features/accounts/passwords-service.js';
import { sessionsRoutes } from './features/accounts/sessions-routes.js';
import { customersRoutes } from './features/customers/customers-routes.js';
import { CustomersService } from './features/customers/customers-service.js';
import { cardPaymentsEvents } from './features/shops/card-payments-service.js';
import { cardPaymentsRoutes } from './features/shops/card-payments-routes.js';
import { acceptanceRoutes, invitationsRoutes } from './features/shops/invitations-routes.js';
import { membersRoutes } from './features/shops/members-routes.js';
import { createShopServices, type ShopServices } from './features/shops/shop-services.js';
import { shopSettingsRoutes } from './features/shops/shop-settings-routes.js';
import { createShop } from './features/shops/shops-public.js';
import { memberAccess, membershipsOf, refuseLapsed } from './features/subscription/member-access.js';
import { subscriptionEvents, subscriptionOutbox } from './features/subscription/subscription-events.js';
import { subscriptionRoutes } from './features/subscription/subscription-routes.js';
import {
  createSubscriptionServices,
  type SubscriptionServices,
} from './features/subscription/subscription-services.js';
import { followMembersLater } from './features/subscription/subscription-sync.js';
import { startTrial } from './features/subscription/trial.js';
import { notFound } from './platform/http/problem-error.js';
import type { Access } from './platform/http/mount.js';
import type { Route } from './platform/http/route.js';
import { tryLimits } from './platform/http/try-limits.js';
import { createUploadReader } from './platform/http/uploads.js';
import { MAIL, Mailer, type DocumentMaker, type DocumentRef, type Letter } from './platform/mail/mail.js';
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
  SubscriptionServices & {
    accounts: AccountsService;
    passwords: PasswordsService;
    customers: CustomersService;
  };

/** Wires everything. The only place that knows which service needs which. */
export function compose(platform: Platform): Product {
  const services = createServices(platform);
  const routes = createRoutes(services, platform);
  const mailer = new Mailer(platform.config.mail, documentMaker({}));
  const outbox = new OutboxWorker(
    platform.dataSource,
    {
      ...outboxHandlers(mailer, {
        ...subscriptionEvents({ ...services, ...platform }),
        ...cardPaymentsEvents(services.cardPayments),
      }),
      ...accountsOutbox({ ...services, ...platform }),
      ...subscriptionOutbox({ ...services, ...platform }),
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
    mount: { ...platform, access: createAccess(platform), uploads: createUploadReader() },
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
  const { config } = platform;
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
    ...createShopServices(platform, { membersChanged: followMembersLater, refuseLapsed }),
    ...createSubscriptionServices(platform),
    customers: new CustomersService(),
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
  ];
}

function createAccess(platform: Platform): Access {
  const { limits, sessions } = platform;
  return {
    member: memberAccess,
    link: () => Promise.reject(notFound('This link')),
    sessionOf: (request) => sessionOf(request, sessions),
    ...tryLimits(limits, (request) => request.session.personId ?? null),
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

function outboxHandlers(mailer: Mailer, onPaymentEvent: Record<string, PaymentEventHandler>) {
  return {
    [MAIL]: (letter: Letter, message: { id: string }) => mailer.send(letter, message.id),
    [PAYMENT_EVENT]: async (event: Stripe.Event) => {
      // Types we did not ask for are taken in and let go.
      await onPaymentEvent[event.type]?.(event);
    },
  };
}
