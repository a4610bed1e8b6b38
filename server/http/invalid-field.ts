import { ApiError } from './api-error.ts';

/**
 * The refusal of one value that only the server can judge.
 *
 * @param pointer JSON pointer into the body
 * @param message what was expected, for the screen
 */
export function invalidField(pointer: string, message: string): ApiError {
  return new ApiError('invalid-input', `${pointer}: ${message}`, {
    fields: [{ pointer, message }],
  });
}
