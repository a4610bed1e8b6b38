const FORBIDDEN = new Set(['__proto__', 'constructor', 'prototype']);

/** Whether a name from outside could reach into an object's prototype. */
export function isForbiddenKey(key: string): boolean {
  return FORBIDDEN.has(key);
}
