import type { ProjectRole } from '../../shared/review/revision-state.ts';
import type { Actor } from '../audit/act.ts';
import { ApiError } from './api-error.ts';

/**
 * Who may call a route. Every route declares one; without it the route does not exist.
 *
 * `{ project }` names what the caller must be in the project the request is about: the service decides it
 * (404 for whoever is no member, 403 for a member without the role), the role matrix of the suites reads it.
 * `{ anyProject }` asks for a role in whatever project, or for an administrator; the service decides as well.
 * An administrator counts as a member who manages, but holds no role by that.
 */
export type Access =
  | 'public'
  | 'signed-in'
  | 'administrator'
  | 'administrator-or-local'
  | { readonly project: 'member' | 'manager' | readonly ProjectRole[] }
  | { readonly anyProject: readonly ProjectRole[] };

/**
 * @param local whether the server can be reached from this machine only
 * @throws {ApiError} not-signed-in or not-permitted
 */
export function requireAccess(access: Access, actor: Actor | null, local: boolean): void {
  if (access === 'public') return;
  if (access === 'administrator-or-local' && local) return;
  if (actor === null) throw new ApiError('not-signed-in', 'Sign in to go on.');
  const administratorOnly = access === 'administrator' || access === 'administrator-or-local';
  if (administratorOnly && !actor.administrator) {
    throw new ApiError('not-permitted', 'Only an administrator can do this.', {
      rule: 'administrator',
    });
  }
}
