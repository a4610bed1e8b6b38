import { ApiError } from './api-error.ts';

/** A resource that can change, at one version. Its ETag is `"<id>-<version>"`. */
export interface Versioned {
  readonly id: string;
  readonly version: number;
}

export function etagOf({ id, version }: Versioned): string {
  return `"${id}-${version}"`;
}

/**
 * The version the caller read, from its If-Match header.
 *
 * @throws {ApiError} version-required without one or for `*`; version-conflict for a weak or foreign tag
 */
export function parseIfMatch(header: string | undefined): Versioned {
  if (header === undefined || header.trim() === '' || header.trim() === '*') {
    throw new ApiError('version-required', 'Send the ETag you read as If-Match.');
  }
  const parts = /^"([\w-]{1,64})-(\d{1,15})"$/.exec(header.trim());
  if (!parts?.[1] || !parts[2]) throw versionConflict();
  return { id: parts[1], version: Number(parts[2]) };
}

/** @throws {ApiError} version-conflict when somebody else saved since the caller read */
export function expectVersion(ifMatch: Versioned, current: Versioned): void {
  if (ifMatch.id !== current.id || ifMatch.version !== current.version) throw versionConflict();
}

function versionConflict(): ApiError {
  return new ApiError('version-conflict', 'It has changed since you read it. Nothing was saved.');
}
