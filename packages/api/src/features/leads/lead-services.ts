import type { CustomersService } from '../customers/customers-public.js';
import { LeadConversion } from './lead-conversion.js';
import type { LeadHooks } from './lead-hooks.js';
import { LeadsService } from './leads-service.js';

export type LeadServices = { leads: LeadsService; conversion: LeadConversion };

export function createLeadServices(customers: CustomersService, hooks: LeadHooks): LeadServices {
  return { leads: new LeadsService(hooks), conversion: new LeadConversion(customers, hooks) };
}
