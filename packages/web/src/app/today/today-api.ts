import { inject, Injectable } from '@angular/core';
import { todaySchema, type Today } from '@bookmatch/common/today/today-contract';
import type { Observable } from 'rxjs';
import { ApiClient } from '../platform/api/api-client';
import { injectShopUrl } from '../platform/session/current-shop';

@Injectable({ providedIn: 'root' })
export class TodayApiClient {
  private readonly api = inject(ApiClient);
  private readonly shopUrl = injectShopUrl();

  read(): Observable<Today> {
    return this.api.get(this.shopUrl('/today'), { answer: todaySchema });
  }
}
