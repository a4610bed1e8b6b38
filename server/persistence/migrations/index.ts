import { CreateAudit1790000000000 } from './1790000000000-create-audit.ts';
import { CreatePeople1790000100000 } from './1790000100000-create-people.ts';
import { CreateProjects1790000200000 } from './1790000200000-create-projects.ts';
import { CreateParts1790000300000 } from './1790000300000-create-parts.ts';
import { CreateStages1790000400000 } from './1790000400000-create-stages.ts';
import { GuardRevisions1790000500000 } from './1790000500000-guard-revisions.ts';
import { CreateBomNotes1790000600000 } from './1790000600000-create-bom-notes.ts';

/** In the order of their time stamps; a migration is never edited after it has left its branch. */
export const migrations = [
  CreateAudit1790000000000,
  CreatePeople1790000100000,
  CreateProjects1790000200000,
  CreateParts1790000300000,
  CreateStages1790000400000,
  GuardRevisions1790000500000,
  CreateBomNotes1790000600000,
] as const;
