import type { EntityManager } from 'typeorm';

/** Every row of every table but the ones left out, as one text to compare. */
export async function contentsOf(
  manager: EntityManager,
  without: readonly string[] = [],
): Promise<string> {
  const tables: { name: string }[] = await manager.query(
    `SELECT name FROM sqlite_schema WHERE type = 'table' ORDER BY name`,
  );
  const rows: unknown[] = [];
  for (const { name } of tables) {
    if (!without.includes(name)) rows.push(name, await manager.query(`SELECT * FROM "${name}"`));
  }
  return JSON.stringify(rows);
}
