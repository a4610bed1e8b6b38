import type { PolicyDifference } from '../../shared/contract/stage.ts';
import type { Policy } from '../../shared/stage/policy.ts';

/** What putting the project's policy in place of the given one changed, key by key. */
export function policyDifference(given: Policy, adopted: Policy): PolicyDifference[] {
  return (Object.keys(adopted) as (keyof Policy)[])
    .filter((key) => given[key] !== adopted[key])
    .map((key) => ({ key, given: given[key], adopted: adopted[key] }));
}
