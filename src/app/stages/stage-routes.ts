import type { Routes } from '@angular/router';
import { unsavedGuard } from './unsaved-guard.ts';

/** Below `/p/:projectId/s`. */
export const stageRoutes: Routes = [
  {
    path: 'new',
    title: 'New stage',
    loadComponent: () => import('./new-stage.ts').then((m) => m.NewStage),
  },
  {
    path: ':stageId/r/:revisionId',
    title: 'Stage',
    canDeactivate: [unsavedGuard],
    loadComponent: () => import('./stage-sheet.ts').then((m) => m.StageSheet),
  },
];
