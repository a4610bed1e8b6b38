import type { Routes } from '@angular/router';
import { signedInGuard, signedOutGuard } from './session/session-guards.ts';

/** Pages before sign-in stand alone; all others stand in the shell. Tabs are path segments, filters are queries. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    canActivate: [signedOutGuard],
    loadComponent: () => import('./session/sign-in.ts').then((m) => m.SignIn),
  },
  {
    path: '',
    canActivate: [signedInGuard],
    loadComponent: () => import('./app-shell.ts').then((m) => m.AppShell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'desk' },
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./app-not-found.ts').then((m) => m.NotFound),
      },
    ],
  },
];
