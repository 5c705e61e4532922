import {
  createCustomerSchema,
  customerListQuerySchema,
  customerPageSchema,
  customerSchema,
  customerWithSitesSchema,
  siteFieldsSchema,
  siteSchema,
} from '@bookmatch/common/customers/customers-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { listCustomers } from './customer-lists.js';
import type { CustomersService } from './customers-service.js';

export function customersRoutes(service: CustomersService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/customers',
      summary: 'List customers',
      allow: ['read', 'Customer'],
      query: customerListQuerySchema,
      answer: customerPageSchema,
      handle: ({ scope, query }) => listCustomers(scope, query),
    }),
    shopRoute({
      method: 'post',
      path: '/customers',
      summary: 'Add a customer',
      allow: ['create', 'Customer'],
      body: createCustomerSchema,
      answer: customerSchema,
      status: 201,
      handle: ({ scope, body }) => service.create(scope, body),
    }),
    shopRoute({
      method: 'get',
      path: '/customers/:id',
      summary: 'Read a customer with their sites',
      allow: ['read', 'Customer'],
      answer: customerWithSitesSchema,
      handle: ({ scope, params }) => service.get(scope, params.id),
    }),
    shopRoute({
      method: 'patch',
      path: '/customers/:id',
      summary: 'Change a customer',
      allow: ['update', 'Customer'],
      versioned: true,
      body: createCustomerSchema,
      answer: customerSchema,
      handle: ({ scope, params, body, version }) => service.update(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/customers/:id/archive',
      summary: 'Leave a customer out of lists',
      allow: ['update', 'Customer'],
      // The second time finds it archived already and changes nothing.
      repeat: 'natural',
      answer: customerSchema,
      handle: ({ scope, params }) => service.archive(scope, params.id, true),
    }),
    shopRoute({
      method: 'post',
      path: '/customers/:id/restore',
      summary: 'Take an archived customer back into lists',
      allow: ['update', 'Customer'],
      // As above.
      repeat: 'natural',
      answer: customerSchema,
      handle: ({ scope, params }) => service.archive(scope, params.id, false),
    }),
    shopRoute({
      method: 'post',
      path: '/customers/:customerId/sites',
      summary: 'Add a site',
      allow: ['create', 'Site'],
      body: siteFieldsSchema,
      answer: siteSchema,
      status: 201,
      handle: ({ scope, params, body }) => service.addSite(scope, params.customerId, body),
    }),
    shopRoute({
      method: 'patch',
      path: '/customers/:customerId/sites/:siteId',
      summary: 'Change a site',
      allow: ['update', 'Site'],
      versioned: true,
      body: siteFieldsSchema,
      answer: siteSchema,
      handle: ({ scope, params, body, version }) => service.updateSite(scope, params, body, version),
    }),
    shopRoute({
      method: 'delete',
      path: '/customers/:customerId/sites/:siteId',
      summary: 'Remove a site that no work went to',
      allow: ['update', 'Site'],
      versioned: true,
      status: 204,
      handle: ({ scope, params, version }) => service.deleteSite(scope, params, version),
    }),
  ];
}
