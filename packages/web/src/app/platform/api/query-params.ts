import { HttpParams } from '@angular/common/http';

export type QueryValue = string | number | boolean | null | undefined;
export type Query = Readonly<Record<string, QueryValue>>;

/** Address parameters without the empty ones: an absent filter is left out, never sent blank. */
export function queryParams(query: Query = {}): HttpParams {
  const present = Object.entries(query).filter(
    ([, value]) => value !== undefined && value !== null && value !== '',
  );
  return new HttpParams({
    fromObject: Object.fromEntries(present.map(([key, value]) => [key, String(value)])),
  });
}

/** The same as a full address, for links that download. */
export function withQuery(url: string, query: Query): string {
  const params = queryParams(query).toString();
  return params ? `${url}?${params}` : url;
}
