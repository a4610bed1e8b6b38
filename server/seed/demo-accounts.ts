import type { DemoAccount } from '../session/session-endpoints.ts';

/** Whom the demo has: one account for each job. They exist on loopback only. */
export type DemoRole = 'designer' | 'checker' | 'approver' | 'exporter' | 'administrator';

export interface DemoPerson extends DemoAccount {
  readonly name: string;
}

export const DEMO_WORKSPACE = 'Coldstore Controls (demo, invented)';

export const DEMO_PEOPLE: Readonly<Record<DemoRole, DemoPerson>> = {
  designer: {
    name: 'A. Designer',
    email: 'designer@coldstore.example',
    password: 'brine-kettle-amber-41',
    does: 'Designer: sizes stages and hands them over',
  },
  checker: {
    name: 'B. Checker',
    email: 'checker@coldstore.example',
    password: 'glacier-lantern-oak-62',
    does: 'Checker: verifies the overdrive margin',
  },
  approver: {
    name: 'C. Approver',
    email: 'approver@coldstore.example',
    password: 'copper-meadow-night-83',
    does: 'Approver: reads the evidence and locks',
  },
  exporter: {
    name: 'E. Exporter',
    email: 'exporter@coldstore.example',
    password: 'harbour-walnut-frost-24',
    does: 'Exporter: issues the BOM note',
  },
  administrator: {
    name: 'M. Administrator',
    email: 'administrator@coldstore.example',
    password: 'pebble-orchard-winter-57',
    does: 'Administrator: people, audit trail and all projects',
  },
};

/** As the sign-in page lists them. */
export const DEMO_ACCOUNTS: readonly DemoAccount[] = Object.values(DEMO_PEOPLE).map(
  ({ does, email, password }) => ({ does, email, password }),
);
