import { CreateAudit1790000000000 } from './1790000000000-create-audit.ts';
import { CreatePeople1790000100000 } from './1790000100000-create-people.ts';

/** In the order of their time stamps; a migration is never edited after it has left its branch. */
export const migrations = [CreateAudit1790000000000, CreatePeople1790000100000] as const;
