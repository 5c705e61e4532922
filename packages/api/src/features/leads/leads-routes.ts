import {
  addLeadNoteSchema,
  convertLeadSchema,
  createLeadSchema,
  leadBoardQuerySchema,
  leadBoardSchema,
  leadExportQuerySchema,
  leadListQuerySchema,
  leadNoteSchema,
  leadNotesSchema,
  leadPageSchema,
  leadSchema,
  loseLeadSchema,
  moveLeadSchema,
  reopenLeadSchema,
  startedEstimateSchema,
  startEstimateSchema,
  updateLeadSchema,
  winLeadSchema,
} from '@bookmatch/common/leads/leads-contract';
import { shopRoute, type Route } from '../../platform/http/route.js';
import { leadBoard } from './lead-board.js';
import type { LeadConversion } from './lead-conversion.js';
import { exportLeads } from './lead-export.js';
import { listLeads } from './lead-lists.js';
import type { LeadServices } from './lead-services.js';
import type { LeadsService } from './leads-service.js';

export function leadsRoutes({ leads, conversion }: LeadServices): Route[] {
  return [
    ...lists(),
    ...leadRoutes(leads),
    ...stageRoutes(leads),
    ...noteRoutes(leads),
    ...nextStops(conversion),
  ];
}

function lists(): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/leads',
      summary: 'List leads',
      allow: ['read', 'Lead'],
      query: leadListQuerySchema,
      answer: leadPageSchema,
      handle: ({ scope, query }) => listLeads(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/leads/board',
      summary: 'The leads by stage',
      allow: ['read', 'Lead'],
      query: leadBoardQuerySchema,
      answer: leadBoardSchema,
      handle: ({ scope, query }) => leadBoard(scope, query),
    }),
    shopRoute({
      method: 'get',
      path: '/leads/export',
      summary: 'The list of leads as CSV',
      allow: ['read', 'Lead'],
      query: leadExportQuerySchema,
      handle: async ({ scope, query }) => exportLeads(scope, query),
    }),
  ];
}

function leadRoutes(leads: LeadsService): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/leads',
      summary: 'Take in a lead',
      allow: ['create', 'Lead'],
      body: createLeadSchema,
      answer: leadSchema,
      status: 201,
      handle: ({ scope, body }) => leads.create(scope, body),
    }),
    shopRoute({
      method: 'get',
      path: '/leads/:id',
      summary: 'Read a lead',
      allow: ['read', 'Lead'],
      answer: leadSchema,
      handle: ({ scope, params }) => leads.get(scope, params.id),
    }),
    shopRoute({
      method: 'patch',
      path: '/leads/:id',
      summary: 'Change a lead',
      allow: ['update', 'Lead'],
      versioned: true,
      body: updateLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, body, version }) => leads.update(scope, params.id, body, version),
    }),
  ];
}

function stageRoutes(leads: LeadsService): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/leads/:id/move',
      summary: 'Take a lead to another open stage',
      allow: ['update', 'Lead'],
      versioned: true,
      body: moveLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, body, version }) => leads.move(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/leads/:id/win',
      summary: 'Say that a lead is won',
      allow: ['update', 'Lead'],
      versioned: true,
      body: winLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, version }) => leads.win(scope, params.id, version),
    }),
    shopRoute({
      method: 'post',
      path: '/leads/:id/lose',
      summary: 'Say that a lead is lost, and why',
      allow: ['update', 'Lead'],
      versioned: true,
      body: loseLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, body, version }) => leads.lose(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/leads/:id/reopen',
      summary: 'Take a lost lead back to where it was lost',
      allow: ['update', 'Lead'],
      versioned: true,
      body: reopenLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, version }) => leads.reopen(scope, params.id, version),
    }),
  ];
}

function noteRoutes(leads: LeadsService): Route[] {
  return [
    shopRoute({
      method: 'get',
      path: '/leads/:id/notes',
      summary: 'The notes about a lead, the newest first',
      allow: ['read', 'Lead'],
      answer: leadNotesSchema,
      handle: ({ scope, params }) => leads.notes(scope, params.id),
    }),
    shopRoute({
      method: 'post',
      path: '/leads/:id/notes',
      summary: 'Add a note about a lead',
      allow: ['update', 'Lead'],
      body: addLeadNoteSchema,
      answer: leadNoteSchema,
      status: 201,
      handle: ({ scope, params, body }) => leads.addNote(scope, params.id, body),
    }),
  ];
}

function nextStops(conversion: LeadConversion): Route[] {
  return [
    shopRoute({
      method: 'post',
      path: '/leads/:id/convert',
      summary: 'Make a customer of a lead, or tie it to one',
      allow: ['update', 'Lead'],
      versioned: true,
      body: convertLeadSchema,
      answer: leadSchema,
      handle: ({ scope, params, body, version }) => conversion.convert(scope, params.id, body, version),
    }),
    shopRoute({
      method: 'post',
      path: '/leads/:id/estimates',
      summary: 'Start an estimate for a lead',
      allow: ['create', 'Estimate'],
      versioned: true,
      body: startEstimateSchema,
      answer: startedEstimateSchema,
      status: 201,
      handle: ({ scope, params, body, version }) => conversion.startEstimate(scope, params.id, body, version),
    }),
  ];
}
