import { invalid, missingParameter, unknownParameters } from './error.js';
import type { FormNode } from './form.js';

/** How one parameter is read: gives its value or throws the provider's 400. `path` is its bracketed name. */
export interface Spec<T> {
  read(node: FormNode, path: string): T;
}

/** A named parameter of a call; `absent` gives its value, or the refusal, when it was not sent. */
export interface Field<T> {
  spec: Spec<T>;
  absent(path: string): T;
}

/** Names the SDK knows for a call; `satisfies Names<…>` on an allow-list makes a misspelled one a type error. */
export type Names<P> = { [K in keyof P]?: Field<unknown> };

export type Values<S> = { [K in keyof S]: S[K] extends Field<infer T> ? T : never };

export function must<T>(spec: Spec<T>): Field<T> {
  return {
    spec,
    absent: (path) => {
      throw missingParameter(path);
    },
  };
}

export function may<T>(spec: Spec<T>): Field<T | undefined> {
  return { spec, absent: () => undefined };
}

function pathOf(parent: string, name: string): string {
  return parent === '' ? name : `${parent}[${name}]`;
}

/** An object with exactly these names: unknown ones are refused together, required ones must be there. */
export function fields<S extends Record<string, Field<unknown>>>(shape: S): Spec<Values<S>> {
  return {
    read(node, path) {
      if (typeof node === 'string') throw invalid('Invalid object', path);
      const strangers = [...node.keys()].filter((name) => !Object.hasOwn(shape, name));
      if (strangers.length > 0) throw unknownParameters(strangers.map((name) => pathOf(path, name)));
      const entries = Object.entries(shape).map(([name, field]) => {
        const child = node.get(name);
        const childPath = pathOf(path, name);
        return [name, child === undefined ? field.absent(childPath) : field.spec.read(child, childPath)];
      });
      return Object.fromEntries(entries) as Values<S>;
    },
  };
}

/** Items in the order of their positions. */
export function list<T>(item: Spec<T>, most = 100): Spec<T[]> {
  return {
    read(node, path) {
      if (typeof node === 'string') throw invalid('Invalid array', path);
      if (node.size > most) throw invalid(`Array has more than ${most} elements`, path);
      return [...node.entries()].map(([key, child], position) => {
        if (key !== String(position)) throw invalid('Invalid array', path);
        return item.read(child, `${path}[${position}]`);
      });
    },
  };
}
