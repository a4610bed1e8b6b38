import { diodeTables } from './diode-tables.ts';
import { loadTables } from './load-tables.ts';
import { logicOutputTables } from './logic-output-tables.ts';
import type { PartRecord } from './part-record.ts';
import type { PartTable } from './part-table.ts';
import { transistorTables } from './transistor-tables.ts';

/**
 * A record as the tables of a data sheet: every printed figure in one cell, each row with its source and
 * confidence. Groups without rows and columns without figures are left out.
 *
 * @param record any part record
 * @returns tables in the order of a data sheet; `rows.length` is the row count, `cellText` writes a cell
 */
export function partGroups(record: PartRecord): PartTable[] {
  switch (record.kind) {
    case 'transistor':
      return transistorTables(record);
    case 'load':
      return loadTables(record);
    case 'logic-output':
      return logicOutputTables(record);
    case 'diode':
      return diodeTables(record);
  }
}
