import { recordAudit } from '../audit/record-audit.ts';
import type { Database } from '../persistence/database.ts';
import type { Services } from '../services.ts';
import { StartRefusal } from '../start-refusal.ts';
import { PersonEntity } from '../users/person-entity.ts';
import { WorkspaceEntity } from '../users/workspace-entity.ts';
import { DEMO_ACCOUNTS, DEMO_WORKSPACE } from './demo-accounts.ts';
import { DemoCrew } from './demo-crew.ts';
import { DemoDesk } from './demo-desk.ts';
import { DemoStory } from './demo-story.ts';
import { loadLibrary } from './load-library.ts';

/**
 * Fills what a fresh database lacks: the shipped part library, and on loopback the demo. Changes nothing on
 * a database that is in use.
 *
 * @param tell prints a line for the person who started the server
 */
export async function prepareDatabase(
  services: Services,
  tell: (line: string) => void,
): Promise<void> {
  const { config, database, demo, hashes, now } = services;
  await loadLibrary(database, now());
  if (!config.demo) return;
  const { people, workspace } = await database.read(async (manager) => ({
    people: await manager.findBy(PersonEntity, {}),
    workspace: await manager.findOneBy(WorkspaceEntity, { id: 1 }),
  }));
  if (people.length === 0) {
    tell('Making the demo: two projects with their history. This takes a few seconds, once.');
    const crew = await DemoCrew.gather(database, hashes, now());
    await new DemoStory(database, crew, new DemoDesk(database, crew)).tell();
    await nameWorkspace(database, now());
  } else if (workspace === null) {
    throw new StartRefusal(
      'SINKWELL_DATA: the demo in this folder was interrupted while it was made; empty the folder and start again',
    );
  }
  const emails = new Set(people.map(({ email }) => email));
  const present = people.length === 0 || DEMO_ACCOUNTS.every(({ email }) => emails.has(email));
  if (!present) return;
  demo.accounts = DEMO_ACCOUNTS;
  tell('Demo accounts, on this machine only:');
  for (const { does, email, password } of DEMO_ACCOUNTS) tell(`  ${email}  ${password}  ${does}`);
}

/** Last of all: the row tells that the demo is complete. */
function nameWorkspace(database: Database, atMs: number): Promise<void> {
  return database.transaction(async (manager) => {
    await manager.insert(WorkspaceEntity, { id: 1, name: DEMO_WORKSPACE });
    await recordAudit(
      manager,
      { actor: null, requestId: 'demo', atMs },
      {
        ...{ action: 'workspace.set-up', objectKind: 'workspace', objectId: 'demo' },
        ...{ objectName: DEMO_WORKSPACE, projectId: null },
        ...{ summary: 'finished making the demo', detail: {} },
      },
    );
  });
}
