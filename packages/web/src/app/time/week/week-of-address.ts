import { inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute } from '@angular/router';
import { map } from 'rxjs';

const A_DAY = /^\d{4}-\d{2}-\d{2}$/;

/** The day of the week wanted, as the address says (`?of=2027-01-14`); nothing for the current week. */
export function injectWeekOfAddress() {
  const route = inject(ActivatedRoute);
  const read = (of: string | null) => (of && A_DAY.test(of) ? of : undefined);
  return toSignal(route.queryParamMap.pipe(map((params) => read(params.get('of')))), {
    initialValue: read(route.snapshot.queryParamMap.get('of')),
  });
}
