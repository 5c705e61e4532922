import type { Platform } from '../../platform/platform.js';
import { CardPaymentsService } from './card-payments-service.js';
import { InvitationAcceptance, type AcceptanceHooks } from './invitation-acceptance.js';
import { InvitationsService } from './invitations-service.js';
import { MembersService, type MemberHooks } from './members-service.js';
import { ShopSettingsService } from './shop-settings-service.js';

export type ShopServices = {
  settings: ShopSettingsService;
  members: MembersService;
  invitations: InvitationsService;
  acceptance: InvitationAcceptance;
  cardPayments: CardPaymentsService;
};

/** The slice's own objects, for `compose.ts`. */
export function createShopServices(
  { config, payments, work, clock }: Platform,
  hooks: MemberHooks & AcceptanceHooks,
): ShopServices {
  const { origin } = config;
  const members = new MembersService(hooks);
  return {
    settings: new ShopSettingsService(),
    members,
    invitations: new InvitationsService(origin),
    acceptance: new InvitationAcceptance(members, hooks),
    cardPayments: new CardPaymentsService({ payments, work, origin, clock }),
  };
}
