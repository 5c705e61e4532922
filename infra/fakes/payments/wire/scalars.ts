import { invalid } from './error.js';
import type { FormNode } from './form.js';
import type { Spec } from './spec.js';

function leaf(node: FormNode, path: string): string {
  if (typeof node !== 'string') throw invalid('Invalid string', path);
  if (node === '') {
    const message = `Empty text for '${path}', which cannot be unset: leave it out or give a value.`;
    throw invalid(message, path, 'parameter_invalid_empty');
  }
  return node;
}

/** `most` counts characters. */
export function text(most = 5000): Spec<string> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      if (value.length > most) throw invalid(`Invalid string: longer than ${most} characters`, path);
      return value;
    },
  };
}

export function integer(least = 0, most = Number.MAX_SAFE_INTEGER): Spec<number> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      if (!/^-?\d{1,15}$/.test(value)) {
        throw invalid(`Invalid integer: ${value}`, path, 'parameter_invalid_integer');
      }
      const number = Number(value);
      if (number < least) throw invalid(`This value must be greater than or equal to ${least}.`, path);
      if (number > most) throw invalid(`This value must be less than or equal to ${most}.`, path);
      return number;
    },
  };
}

export function flag(): Spec<boolean> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      if (value !== 'true' && value !== 'false') throw invalid(`Invalid boolean: ${value}`, path);
      return value === 'true';
    },
  };
}

export function oneOf<const T extends string>(...choices: T[]): Spec<T> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      const found = choices.find((choice) => choice === value);
      if (found === undefined) throw invalid(`Invalid ${path}: must be one of ${choices.join(', ')}`, path);
      return found;
    },
  };
}

/** An absolute http or https address. */
export function url(): Spec<string> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      if (!/^https?:\/\//i.test(value) || !URL.canParse(value)) {
        throw invalid('Not a valid URL', path, 'url_invalid');
      }
      return value;
    },
  };
}

export function isEmail(value: string): boolean {
  return value.length <= 254 && /^[^\s@]+@[^\s@.]+(\.[^\s@.]+)+$/.test(value);
}

export function email(): Spec<string> {
  return {
    read(node, path) {
      const value = leaf(node, path);
      if (!isEmail(value)) throw invalid(`Invalid email address: ${value}`, path, 'email_invalid');
      return value;
    },
  };
}
