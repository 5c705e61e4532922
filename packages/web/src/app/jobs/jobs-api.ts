import { inject, Injectable } from '@angular/core';
import { invoiceSchema, type Invoice } from '@bookmatch/common/invoices/invoices-contract';
import {
  jobCostSchema,
  jobCostsSchema,
  type CreateJobCost,
  type JobCost,
} from '@bookmatch/common/jobs/job-costs-contract';
import {
  jobFilesSchema,
  uploadedJobFileSchema,
  type JobFile,
  type UploadedJobFile,
} from '@bookmatch/common/jobs/job-files-contract';
import {
  jobPageSchema,
  jobSchema,
  type CreateJob,
  type Job,
  type JobRow,
  type MoveJob,
  type UpdateJob,
} from '@bookmatch/common/jobs/jobs-contract';
import { membersSchema, type Member } from '@bookmatch/common/shops/members-contract';
import { operationsSchema, type Operation } from '@bookmatch/common/shops/operations-contract';
import type { Page } from '@bookmatch/common/wire/list';
import { map, type Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { FileUpload, type UploadStep } from '../platform/api/file-upload';
import { withQuery } from '../platform/api/query-params';
import type { ListQuery } from '../platform/lists/list-address';
import { injectShopUrl } from '../platform/session/current-shop';

/** Which job, as it was read. */
export type JobRef = Pick<Job, 'id' | 'version'>;

/** The routes of jobs, and the few of other slices that their screens ask. */
@Injectable({ providedIn: 'root' })
export class JobsApiClient {
  private readonly api = inject(ApiClient);
  private readonly uploads = inject(FileUpload);
  private readonly shopUrl = injectShopUrl();

  list(query: ListQuery): Observable<Page<JobRow>> {
    return this.api.get(this.shopUrl('/jobs'), { answer: jobPageSchema, query });
  }

  /** Where the list with these filters downloads. */
  csvUrl({ after: _, ...query }: ListQuery): string {
    return withQuery(this.shopUrl('/jobs/export'), query);
  }

  read(id: string): Observable<Job> {
    return this.api.get(this.shopUrl(`/jobs/${id}`), { answer: jobSchema });
  }

  create(fields: CreateJob): Observable<Job> {
    return this.api.post(this.shopUrl('/jobs'), fields, { answer: jobSchema });
  }

  update({ id, version }: JobRef, fields: UpdateJob): Observable<Job> {
    return this.api.patch(this.shopUrl(`/jobs/${id}`), fields, { answer: jobSchema, version });
  }

  move({ id, version }: JobRef, move: MoveJob): Observable<Job> {
    return this.api.post(this.shopUrl(`/jobs/${id}/move`), move, { answer: jobSchema, version });
  }

  assign({ id, version }: JobRef, memberIds: string[]): Observable<Job> {
    return this.api.post(this.shopUrl(`/jobs/${id}/assign`), { memberIds }, { answer: jobSchema, version });
  }

  costs(jobId: string): Observable<JobCost[]> {
    const answer = jobCostsSchema;
    return this.api.get(this.shopUrl(`/jobs/${jobId}/costs`), { answer }).pipe(map(({ rows }) => rows));
  }

  addCost(jobId: string, cost: CreateJobCost): Observable<JobCost> {
    return this.api.post(this.shopUrl(`/jobs/${jobId}/costs`), cost, { answer: jobCostSchema });
  }

  reverseCost(jobId: string, costId: string, reason: string): Observable<JobCost> {
    const url = this.shopUrl(`/jobs/${jobId}/costs/${costId}/reverse`);
    return this.api.post(url, { reason }, { answer: jobCostSchema });
  }

  files(jobId: string): Observable<JobFile[]> {
    const answer = jobFilesSchema;
    return this.api.get(this.shopUrl(`/jobs/${jobId}/files`), { answer }).pipe(map(({ rows }) => rows));
  }

  upload(jobId: string, file: File): Observable<UploadStep<UploadedJobFile>> {
    return this.uploads.send(this.shopUrl(`/jobs/${jobId}/files`), file, uploadedJobFileSchema);
  }

  removeFile(jobId: string, fileId: string): Observable<void> {
    return this.api.delete(this.shopUrl(`/jobs/${jobId}/files/${fileId}`));
  }

  /** Where a file's content is, or the small picture of a photo. */
  fileUrl(jobId: string, fileId: string, what: 'content' | 'thumbnail'): string {
    return this.shopUrl(`/jobs/${jobId}/files/${fileId}/${what}`);
  }

  /** Drafts the invoice of a billing stage. */
  billStage(jobId: string, billingStageId: string): Observable<Invoice> {
    const body = { from: 'stage', jobId, billingStageId };
    return this.api.post(this.shopUrl('/invoices'), body, { answer: invoiceSchema });
  }

  members(): Observable<Member[]> {
    return this.api.get(this.shopUrl('/members'), { answer: membersSchema }).pipe(map(({ rows }) => rows));
  }

  operations(): Observable<Operation[]> {
    return this.api
      .get(this.shopUrl('/operations'), { answer: operationsSchema })
      .pipe(map(({ rows }) => rows));
  }
}
