import {
  changeRoleSchema,
  memberSchema,
  membersSchema,
  setLaborCostSchema,
} from '@bookmatch/common/shops/members-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { MembersService } from './members-service.js';

export function membersRoutes(service: MembersService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/members',
      summary: 'List the members',
      allow: ['read', 'Member'],
      answer: membersSchema,
      handle: ({ scope }) => service.list(scope),
    }),
    shopRoute({
      method: 'patch',
      path: '/members/:id/role',
      summary: "Change a member's role",
      allow: ['update', 'Member'],
      versioned: true,
      body: changeRoleSchema,
      answer: memberSchema,
      handle: ({ scope, params, body, version }) => service.changeRole(scope, params.id, body.role, version),
    }),
    shopRoute({
      method: 'patch',
      path: '/members/:id/labor-cost',
      summary: 'Say what an hour of a member costs',
      allow: ['update', 'Member'],
      versioned: true,
      body: setLaborCostSchema,
      answer: memberSchema,
      handle: ({ scope, params, body, version }) =>
        service.setLaborCost(scope, params.id, body.laborCostCentsPerHour, version),
    }),
    shopRoute({
      method: 'delete',
      path: '/members/:id',
      summary: 'Remove a member',
      allow: ['delete', 'Member'],
      versioned: true,
      // Somebody who left is locked out whether the shop has paid or not, and fewer members make paying again cheaper.
      whenLapsed: 'allowed',
      status: 204,
      handle: ({ scope, params, version }) => service.remove(scope, params.id, version),
    }),
  ];
}
