import { clockJobsSchema, clockStateSchema, punchedSchema } from '@bookmatch/common/time/clock-contract';
import {
  addTimeEntrySchema,
  clockInSchema,
  clockOutSchema,
  correctTimeEntrySchema,
  timeEntryPageSchema,
  timeEntrySchema,
  timeListQuerySchema,
  voidTimeEntrySchema,
} from '@bookmatch/common/time/time-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { clockJobs } from './clock-jobs.js';
import type { ClockService } from './clock-service.js';
import { clockStateOf } from './clock-state.js';
import type { EntriesService } from './entries-service.js';
import { listEntries } from './time-lists.js';
import { weeksRoutes } from './weeks-routes.js';

export function timeRoutes(services: { clock: ClockService; timeEntries: EntriesService }): Route[] {
  return [...clockRoutes(services.clock), ...entriesRoutes(services.timeEntries), ...weeksRoutes()];
}

function clockRoutes(service: ClockService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/time/clock',
      summary: 'What one is clocked in to, and what one can clock in to',
      allow: ['read', 'TimeEntry'],
      answer: clockStateSchema,
      handle: ({ scope }) => clockStateOf(scope),
    }),
    shopRoute({
      method: 'get',
      path: '/time/clock/jobs',
      summary: 'Every job one can clock in to',
      allow: ['create', 'TimeEntry'],
      answer: clockJobsSchema,
      handle: ({ scope }) => clockJobs(scope),
    }),
    shopRoute({
      method: 'post',
      path: '/time/clock-in',
      summary: 'Clock in, or switch',
      allow: ['create', 'TimeEntry'],
      // The client makes the entry's id when the punch happens: it is the key, also days later and on another connection.
      repeat: 'natural',
      body: clockInSchema,
      answer: punchedSchema,
      handle: ({ scope, body }) => service.clockIn(scope, body),
    }),
    shopRoute({
      method: 'post',
      path: '/time/entries/:id/clock-out',
      summary: 'Clock out',
      allow: ['update', 'TimeEntry'],
      // An entry is closed once; the second time it is answered as it stands.
      repeat: 'natural',
      body: clockOutSchema,
      answer: punchedSchema,
      handle: ({ scope, params, body }) => service.clockOut(scope, params.id, body),
    }),
  ];
}

function entriesRoutes(service: EntriesService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/time/entries',
      summary: 'List the time entries one may see',
      allow: ['read', 'TimeEntry'],
      query: timeListQuerySchema,
      answer: timeEntryPageSchema,
      handle: ({ scope, query }) => listEntries(scope, query),
    }),
    shopRoute({
      method: 'post',
      path: '/time/entries',
      summary: 'Enter forgotten time',
      allow: ['correct', 'TimeEntry'],
      body: addTimeEntrySchema,
      answer: timeEntrySchema,
      status: 201,
      handle: ({ scope, body }) => service.add(scope, body),
    }),
    shopRoute({
      method: 'get',
      path: '/time/entries/:id',
      summary: 'Read a time entry with its corrections',
      allow: ['read', 'TimeEntry'],
      answer: timeEntrySchema,
      handle: ({ scope, params }) => service.get(scope, params.id),
    }),
    shopRoute({
      method: 'patch',
      path: '/time/entries/:id',
      summary: 'Correct a time entry',
      allow: ['correct', 'TimeEntry'],
      versioned: true,
      body: correctTimeEntrySchema,
      answer: timeEntrySchema,
      handle: ({ scope, params, body, version }) => service.correct(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/time/entries/:id/void',
      summary: 'Take a time entry out of every sum',
      allow: ['correct', 'TimeEntry'],
      versioned: true,
      body: voidTimeEntrySchema,
      answer: timeEntrySchema,
      handle: ({ scope, params, body, version }) => service.void(scope, params.id, body.reason, version),
    }),
  ];
}
