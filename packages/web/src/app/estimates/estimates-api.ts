import { inject, Injectable } from '@angular/core';
import {
  createdLinkSchema,
  linkSchema,
  linksSchema,
  type CreatedLink,
  type Link,
} from '@bookmatch/common/customer-page/links-contract';
import { questionSchema, type Question } from '@bookmatch/common/customer-page/questions-contract';
import {
  estimatePageSchema,
  estimateSchema,
  type CreateEstimate,
  type Estimate,
  type EstimateRow,
  type SendEstimate,
  type UpdateEstimate,
} from '@bookmatch/common/estimates/estimates-contract';
import {
  revisionSchema,
  type Revision,
  type SaveRevision,
} from '@bookmatch/common/estimates/revision-contract';
import { operationsSchema, type Operation } from '@bookmatch/common/shops/operations-contract';
import type { Page, Rows } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** Which revision, as it was read. */
export type RevisionRef = { estimateId: string; revisionId: string };
/** A row at the version it was read with. */
export type Versioned = { id: string; version: number };

/** The routes of estimates, their revisions, questions and links, one method each. */
@Injectable({ providedIn: 'root' })
export class EstimatesApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  list(query: ListQuery): Observable<Page<EstimateRow>> {
    return this.api.get(this.shopUrl('/estimates'), { answer: estimatePageSchema, query });
  }

  /** Where the list downloads as CSV. */
  csvUrl({ after: _after, ...query }: ListQuery): string {
    return withQuery(this.shopUrl('/estimates/export'), query);
  }

  read(id: string): Observable<Estimate> {
    return this.api.get(this.shopUrl(`/estimates/${id}`), { answer: estimateSchema });
  }

  create(fields: CreateEstimate): Observable<Estimate> {
    return this.api.post(this.shopUrl('/estimates'), fields, { answer: estimateSchema });
  }

  update({ id, version }: Versioned, fields: UpdateEstimate): Observable<Estimate> {
    return this.api.patch(this.shopUrl(`/estimates/${id}`), fields, { answer: estimateSchema, version });
  }

  duplicate(id: string): Observable<Estimate> {
    return this.api.post(this.shopUrl(`/estimates/${id}/duplicate`), {}, { answer: estimateSchema });
  }

  send({ id, version }: Versioned, fields: SendEstimate): Observable<Estimate> {
    return this.api.post(this.shopUrl(`/estimates/${id}/send`), fields, { answer: estimateSchema, version });
  }

  decline({ id, version }: Versioned, reason: string): Observable<Estimate> {
    const url = this.shopUrl(`/estimates/${id}/decline`);
    return this.api.post(url, { reason }, { answer: estimateSchema, version });
  }

  createRevision({ id, version }: Versioned): Observable<Estimate> {
    const url = this.shopUrl(`/estimates/${id}/revisions`);
    return this.api.post(url, {}, { answer: estimateSchema, version });
  }

  readRevision(ref: RevisionRef): Observable<Revision> {
    return this.api.get(this.revisionUrl(ref), { answer: revisionSchema });
  }

  saveRevision(ref: RevisionRef, version: number, content: SaveRevision): Observable<Revision> {
    return this.api.put(this.revisionUrl(ref), content, { answer: revisionSchema, version });
  }

  answer(estimateId: string, questionId: string, body: string): Observable<Question> {
    const url = this.shopUrl(`/estimates/${estimateId}/questions/${questionId}/answer`);
    return this.api.post(url, { body }, { answer: questionSchema });
  }

  links(subjectId: string): Observable<Rows<Link>> {
    const query = { subject: 'estimate', subjectId };
    return this.api.get(this.shopUrl('/links'), { answer: linksSchema, query });
  }

  createLink(subjectId: string): Observable<CreatedLink> {
    return this.api.post(
      this.shopUrl('/links'),
      { subject: 'estimate', subjectId },
      { answer: createdLinkSchema },
    );
  }

  revokeLink(id: string): Observable<Link> {
    return this.api.post(this.shopUrl(`/links/${id}/revoke`), undefined, { answer: linkSchema });
  }

  operations(): Observable<Rows<Operation>> {
    return this.api.get(this.shopUrl('/operations'), { answer: operationsSchema });
  }

  /** Where the browser opens a revision's pages. */
  pdfUrl(ref: RevisionRef): string {
    return `${this.revisionUrl(ref)}/pdf`;
  }

  private revisionUrl({ estimateId, revisionId }: RevisionRef): string {
    return this.shopUrl(`/estimates/${estimateId}/revisions/${revisionId}`);
  }
}
