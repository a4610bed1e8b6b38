import type { Actor } from '../audit/act.ts';

declare global {
  // eslint-disable-next-line @typescript-eslint/no-namespace -- the way Express lets its types be told
  namespace Express {
    // eslint-disable-next-line @typescript-eslint/no-empty-object-type -- merges into Express's own
    interface User extends Actor {}
  }
}
