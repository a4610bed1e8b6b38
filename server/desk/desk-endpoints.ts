import type { EntityManager } from 'typeorm';
import { countDesk, type Desk, DESK_GROUPS, readDesk } from '../../shared/contract/desk.ts';
import type { Actor } from '../audit/act.ts';
import { endpoint, type Endpoint } from '../http/endpoint.ts';
import type { Database } from '../persistence/database.ts';
import { namesOf } from '../projects/names-of.ts';
import { recentActivity } from '../projects/project-activity.ts';
import { checkMonth } from './check-month.ts';
import { deskGroups, waitingForOthers } from './desk-groups.ts';
import type { UnnamedItem } from './desk-item.ts';
import { deskMaterial } from './desk-material.ts';

const MOST_ACTIVITY = 14;

export function deskEndpoints({ database }: { readonly database: Database }): Endpoint[] {
  return [
    endpoint(readDesk, 'signed-in', async ({ actor, atMs }) => ({
      body: await database.read((manager) => deskOf(manager, actor, atMs)),
    })),
    endpoint(countDesk, 'signed-in', ({ actor }) =>
      database.read(async (manager) => {
        const groups = deskGroups(await deskMaterial(manager, actor));
        return { body: { waiting: Object.values(groups).flat().length } };
      }),
    ),
  ];
}

async function deskOf(manager: EntityManager, actor: Actor, nowMs: number): Promise<Desk> {
  const material = await deskMaterial(manager, actor);
  const groups = deskGroups(material);
  const others = waitingForOthers(material);
  const items = [...Object.values(groups).flat(), ...others];
  const named = await namesOf(
    manager,
    items.flatMap(({ fromId }) => fromId ?? []),
  );
  const shown = ({ fromId, ...item }: UnnamedItem) => ({
    ...item,
    from: fromId === null ? null : named(fromId).name,
  });
  return {
    groups: DESK_GROUPS.map((kind) => ({ kind, items: groups[kind].map(shown) })),
    waitingForOthers: others.map(shown),
    activity: await recentActivity(manager, [...material.projects.keys()], MOST_ACTIVITY),
    month: await checkMonth(manager, actor.id, nowMs),
  };
}
