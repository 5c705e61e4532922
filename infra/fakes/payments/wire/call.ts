import type { Desk } from '../desk.js';
import { expand } from './expand.js';
import type { FormMap } from './form.js';
import { list, may, type Spec } from './spec.js';
import { text } from './scalars.js';

/** The work of a call, once its parameters are known to be good. `id` is the one in the address, or empty. */
export type Work = (desk: Desk, id: string) => object;

export interface Call {
  method: 'get' | 'post' | 'delete';
  path: string;
  /** Reads the parameters. Errors: the provider's 400. */
  prepare(form: FormMap): Work;
}

/** The parameter that every call takes: which ids to answer as whole objects. */
export const expandable = { expand: may(list(text(200), 20)) };

interface CallSource<P> {
  method: Call['method'];
  path: string;
  params: Spec<P>;
  run(desk: Desk, params: P, id: string): object;
}

export function call<P extends { expand: string[] | undefined }>(source: CallSource<P>): Call {
  return {
    method: source.method,
    path: source.path,
    prepare(form) {
      const params = source.params.read(form, '');
      return (desk, id) => expand(desk, source.run(desk, params, id), params.expand ?? []);
    },
  };
}
