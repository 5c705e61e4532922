import { inject, Injectable } from '@angular/core';
import type { Role } from '@bookmatch/common/access/roles';
import {
  invitationSchema,
  invitationsSchema,
  memberSchema,
  membersSchema,
  type Invitation,
  type Invite,
  type Member,
} from '@bookmatch/common/shops/members-contract';
import {
  operationSchema,
  operationsSchema,
  type CreateOperation,
  type Operation,
  type UpdateOperation,
} from '@bookmatch/common/shops/operations-contract';
import { shopSchema, type Shop, type UpdateShop } from '@bookmatch/common/shops/shops-contract';
import { redirectSchema, type Redirect } from '@bookmatch/common/wire/fields';
import type { Rows } from '@bookmatch/common/wire/list';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { injectShopUrl } from '../platform/session/current-shop';

/** Which row, as it was read. */
export type RowRef = { id: string; version: number };

/** The routes of the shop's own house, one method each. */
@Injectable({ providedIn: 'root' })
export class ShopsApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  readSettings(): Observable<Shop> {
    return this.api.get(this.shopUrl('/shop'), { answer: shopSchema });
  }

  changeSettings(version: number, fields: UpdateShop): Observable<Shop> {
    return this.api.patch(this.shopUrl('/shop'), fields, { answer: shopSchema, version });
  }

  setUpCardPayments(): Observable<Redirect> {
    return this.api.post(this.shopUrl('/shop/card-payments'), undefined, { answer: redirectSchema });
  }

  refreshCardPayments(): Observable<Shop> {
    return this.api.post(this.shopUrl('/shop/card-payments/refresh'), undefined, { answer: shopSchema });
  }

  members(): Observable<Rows<Member>> {
    return this.api.get(this.shopUrl('/members'), { answer: membersSchema });
  }

  changeRole({ id, version }: RowRef, role: Role): Observable<Member> {
    return this.api.patch(this.shopUrl(`/members/${id}/role`), { role }, { answer: memberSchema, version });
  }

  setLaborCost({ id, version }: RowRef, laborCostCentsPerHour: number | null): Observable<Member> {
    const url = this.shopUrl(`/members/${id}/labor-cost`);
    return this.api.patch(url, { laborCostCentsPerHour }, { answer: memberSchema, version });
  }

  removeMember({ id, version }: RowRef): Observable<void> {
    return this.api.delete(this.shopUrl(`/members/${id}`), { version });
  }

  invitations(): Observable<Rows<Invitation>> {
    return this.api.get(this.shopUrl('/invitations'), { answer: invitationsSchema });
  }

  invite(invite: Invite): Observable<Invitation> {
    return this.api.post(this.shopUrl('/invitations'), invite, { answer: invitationSchema });
  }

  resend(id: string): Observable<Invitation> {
    return this.api.post(this.shopUrl(`/invitations/${id}/resend`), undefined, { answer: invitationSchema });
  }

  withdraw(id: string): Observable<void> {
    return this.api.delete(this.shopUrl(`/invitations/${id}`));
  }

  operations(): Observable<Rows<Operation>> {
    return this.api.get(this.shopUrl('/operations'), { answer: operationsSchema });
  }

  addOperation(fields: CreateOperation): Observable<Operation> {
    return this.api.post(this.shopUrl('/operations'), fields, { answer: operationSchema });
  }

  changeOperation({ id, version }: RowRef, fields: UpdateOperation): Observable<Operation> {
    return this.api.patch(this.shopUrl(`/operations/${id}`), fields, { answer: operationSchema, version });
  }

  reorderOperations(operationIds: string[]): Observable<Rows<Operation>> {
    return this.api.post(this.shopUrl('/operations/reorder'), { operationIds }, { answer: operationsSchema });
  }
}
