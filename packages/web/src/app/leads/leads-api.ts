import { inject, Injectable } from '@angular/core';
import {
  leadBoardSchema,
  leadNoteSchema,
  leadNotesSchema,
  leadPageSchema,
  leadSchema,
  startedEstimateSchema,
  type AddLeadNote,
  type ConvertLead,
  type CreateLead,
  type Lead,
  type LeadBoard,
  type LeadNote,
  type LeadRow,
  type LoseLead,
  type OpenLeadStage,
  type StartedEstimate,
  type StartEstimate,
  type UpdateLead,
} from '@bookmatch/common/leads/leads-contract';
import type { Page, Rows } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** Which lead, as it was read. */
export type LeadRef = Pick<Lead, 'id' | 'version'>;

/** The routes of leads, one method each. */
@Injectable({ providedIn: 'root' })
export class LeadsApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  list(query: ListQuery): Observable<Page<LeadRow>> {
    return this.api.get(this.shopUrl('/leads'), { answer: leadPageSchema, query });
  }

  /** Where the list downloads as CSV. */
  csvUrl({ after: _after, ...query }: ListQuery): string {
    return withQuery(this.shopUrl('/leads/export'), query);
  }

  board(query: ListQuery): Observable<LeadBoard> {
    return this.api.get(this.shopUrl('/leads/board'), { answer: leadBoardSchema, query });
  }

  read(id: string): Observable<Lead> {
    return this.api.get(this.shopUrl(`/leads/${id}`), { answer: leadSchema });
  }

  create(fields: CreateLead): Observable<Lead> {
    return this.api.post(this.shopUrl('/leads'), fields, { answer: leadSchema });
  }

  update({ id, version }: LeadRef, fields: UpdateLead): Observable<Lead> {
    return this.api.patch(this.shopUrl(`/leads/${id}`), fields, { answer: leadSchema, version });
  }

  move(lead: LeadRef, stage: OpenLeadStage): Observable<Lead> {
    return this.command(lead, 'move', { stage });
  }

  win(lead: LeadRef): Observable<Lead> {
    return this.command(lead, 'win', {});
  }

  lose(lead: LeadRef, loss: LoseLead): Observable<Lead> {
    return this.command(lead, 'lose', loss);
  }

  reopen(lead: LeadRef): Observable<Lead> {
    return this.command(lead, 'reopen', {});
  }

  convert(lead: LeadRef, conversion: ConvertLead): Observable<Lead> {
    return this.command(lead, 'convert', conversion);
  }

  startEstimate({ id, version }: LeadRef, estimate: StartEstimate): Observable<StartedEstimate> {
    const url = this.shopUrl(`/leads/${id}/estimates`);
    return this.api.post(url, estimate, { answer: startedEstimateSchema, version });
  }

  notes(id: string): Observable<Rows<LeadNote>> {
    return this.api.get(this.shopUrl(`/leads/${id}/notes`), { answer: leadNotesSchema });
  }

  addNote(id: string, note: AddLeadNote): Observable<LeadNote> {
    return this.api.post(this.shopUrl(`/leads/${id}/notes`), note, { answer: leadNoteSchema });
  }

  private command({ id, version }: LeadRef, verb: string, body: object): Observable<Lead> {
    return this.api.post(this.shopUrl(`/leads/${id}/${verb}`), body, { answer: leadSchema, version });
  }
}
