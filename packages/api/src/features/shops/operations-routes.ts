import {
  createOperationSchema,
  operationSchema,
  operationsSchema,
  reorderOperationsSchema,
  updateOperationSchema,
} from '@bookmatch/common/shops/operations-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import type { OperationsService } from './operations-service.js';

export function operationsRoutes(service: OperationsService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/operations',
      summary: 'List operations in their order, archived ones included',
      allow: ['read', 'Operation'],
      answer: operationsSchema,
      handle: async ({ scope }) => ({ rows: await service.list(scope) }),
    }),
    shopRoute({
      method: 'post',
      path: '/operations',
      summary: 'Add an operation',
      allow: ['create', 'Operation'],
      body: createOperationSchema,
      answer: operationSchema,
      status: 201,
      handle: ({ scope, body }) => service.create(scope, body),
    }),
    shopRoute({
      method: 'post',
      path: '/operations/reorder',
      summary: 'Put all operations in a new order',
      allow: ['update', 'Operation'],
      // The same order put twice is the same order.
      repeat: 'natural',
      body: reorderOperationsSchema,
      answer: operationsSchema,
      handle: async ({ scope, body }) => ({ rows: await service.reorder(scope, body.operationIds) }),
    }),
    shopRoute({
      method: 'patch',
      path: '/operations/:id',
      summary: 'Change, archive or restore an operation',
      allow: ['update', 'Operation'],
      versioned: true,
      body: updateOperationSchema,
      answer: operationSchema,
      handle: ({ scope, params, body, version }) => service.update(scope, params.id, body, version),
    }),
  ];
}
