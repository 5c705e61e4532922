/** The provider's error object; `type` and `code` are the words the SDK reads. */
export interface ErrorBody {
  type: 'invalid_request_error' | 'idempotency_error' | 'api_error' | 'card_error';
  message: string;
  code?: string;
  param?: string;
}

/** A refusal with its HTTP status and the body the provider would send. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly body: ErrorBody,
  ) {
    super(body.message);
  }
}

/** 400 for a request that cannot be taken as it stands. */
export function invalid(message: string, param?: string, code?: string): ApiError {
  return new ApiError(400, {
    type: 'invalid_request_error',
    message,
    ...(code === undefined ? {} : { code }),
    ...(param === undefined ? {} : { param }),
  });
}

export function unknownParameters(names: string[]): ApiError {
  const word = names.length === 1 ? 'parameter' : 'parameters';
  return invalid(`Received unknown ${word}: ${names.join(', ')}`, names[0], 'parameter_unknown');
}

export function missingParameter(name: string): ApiError {
  return invalid(`Missing required param: ${name}.`, name, 'parameter_missing');
}

/** 404 for an id in the address; 400 for one in a parameter, as the provider does. */
export function noSuch(what: string, id: string, param: string, status: 400 | 404): ApiError {
  return new ApiError(status, {
    type: 'invalid_request_error',
    code: 'resource_missing',
    message: `No such ${what}: '${id}'`,
    param,
  });
}
