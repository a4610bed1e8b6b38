import type { Routes } from '@angular/router';
import { leaveGuard } from './parts/leave-guard.ts';
import { LINK_PAGES } from '../../shared/contract/account.ts';
import { unsentGuard } from './review/unsent-guard.ts';
import { administratorGuard, signedInGuard, signedOutGuard } from './session/session-guards.ts';

/** Pages before sign-in stand alone; all others stand in the shell. Tabs are path segments, filters are queries. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    canActivate: [signedOutGuard],
    loadComponent: () => import('./session/sign-in.ts').then((m) => m.SignIn),
  },
  {
    path: 'set-up',
    title: 'Set up',
    canActivate: [signedOutGuard],
    loadComponent: () => import('./session/set-up.ts').then((m) => m.SetUp),
  },
  {
    path: LINK_PAGES.invitation,
    title: 'Invitation',
    data: { purpose: 'invitation' },
    loadComponent: () => import('./session/new-password.ts').then((m) => m.NewPassword),
  },
  {
    path: LINK_PAGES.passwordReset,
    title: 'New password',
    data: { purpose: 'reset' },
    loadComponent: () => import('./session/new-password.ts').then((m) => m.NewPassword),
  },
  {
    path: LINK_PAGES.emailChange,
    title: 'E-mail address',
    loadComponent: () => import('./session/confirm-email.ts').then((m) => m.ConfirmEmail),
  },
  {
    path: 'reset',
    title: 'Reset the password',
    loadComponent: () => import('./session/ask-reset.ts').then((m) => m.AskReset),
  },
  {
    path: '',
    canActivate: [signedInGuard],
    loadComponent: () => import('./app-shell.ts').then((m) => m.AppShell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'desk' },
      {
        path: 'p/:projectId/s',
        loadChildren: () => import('./stages/stage-routes.ts').then((m) => m.stageRoutes),
      },
      {
        path: 'desk',
        title: 'My desk',
        loadComponent: () => import('./desk/desk-page.ts').then((m) => m.DeskPage),
      },
      {
        path: 'projects',
        title: 'Projects',
        loadComponent: () => import('./projects/project-list.ts').then((m) => m.ProjectList),
      },
      {
        path: 'projects/new',
        title: 'New project',
        loadComponent: () => import('./projects/new-project.ts').then((m) => m.NewProject),
      },
      {
        path: 'p/:projectId',
        title: 'Project',
        loadComponent: () => import('./projects/project-page.ts').then((m) => m.ProjectPage),
        children: [
          { path: '', pathMatch: 'full', redirectTo: 'stages' },
          {
            path: 'stages',
            title: 'Stages',
            loadComponent: () =>
              import('./projects/project-stages.ts').then((m) => m.ProjectStages),
          },
          {
            path: 'bom-note',
            title: 'BOM note',
            loadComponent: () => import('./bom-note/bom-note-page.ts').then((m) => m.BomNotePage),
          },
          {
            path: 'bom-note/:noteId',
            title: 'BOM note',
            loadComponent: () =>
              import('./bom-note/issued-note-page.ts').then((m) => m.IssuedNotePage),
          },
          {
            path: 'policy',
            title: 'Policy',
            loadComponent: () =>
              import('./projects/project-policy.ts').then((m) => m.ProjectPolicy),
          },
          {
            path: 'members',
            title: 'Members',
            loadComponent: () =>
              import('./projects/project-members.ts').then((m) => m.ProjectMembers),
          },
          {
            path: 'activity',
            title: 'Activity',
            loadComponent: () =>
              import('./projects/project-activity.ts').then((m) => m.ProjectActivity),
          },
        ],
      },
      {
        path: 'account',
        title: 'Account and appearance',
        loadComponent: () => import('./session/account-page.ts').then((m) => m.AccountPage),
      },
      {
        path: 'admin',
        canActivate: [administratorGuard],
        children: [
          {
            path: 'people',
            title: 'People',
            loadComponent: () => import('./people/people-page.ts').then((m) => m.PeoplePage),
          },
          {
            path: 'audit',
            title: 'Audit trail',
            loadComponent: () => import('./people/audit-page.ts').then((m) => m.AuditPage),
          },
          {
            path: 'mailbox',
            title: 'Mailbox',
            loadComponent: () => import('./people/mailbox-page.ts').then((m) => m.MailboxPage),
          },
        ],
      },
      {
        path: 'parts',
        title: 'Parts',
        loadComponent: () => import('./parts/part-list.ts').then((m) => m.PartList),
      },
      {
        path: 'parts/new',
        title: 'New part',
        canDeactivate: [leaveGuard],
        loadComponent: () => import('./parts/part-edit.ts').then((m) => m.PartEdit),
      },
      {
        path: 'parts/:partId',
        title: 'Part',
        loadComponent: () => import('./parts/part-page.ts').then((m) => m.PartPage),
      },
      {
        path: 'parts/:partId/edit',
        title: 'New revision',
        canDeactivate: [leaveGuard],
        loadComponent: () => import('./parts/part-edit.ts').then((m) => m.PartEdit),
      },
      {
        path: 'method',
        title: 'Method',
        loadComponent: () => import('./method/method-page.ts').then((m) => m.MethodPage),
      },
      {
        path: 'p/:projectId/s/:stageId/r/:revisionId/check',
        title: 'Check',
        canDeactivate: [unsentGuard],
        loadComponent: () => import('./review/check-page.ts').then((m) => m.CheckPage),
      },
      {
        path: 'p/:projectId/s/:stageId/r/:revisionId/calculation',
        title: 'Calculation',
        loadComponent: () =>
          import('./calculation/calculation-page.ts').then((m) => m.CalculationPage),
      },
      {
        path: 'p/:projectId/s/:stageId/r/:revisionId/lock',
        title: 'Approve',
        loadComponent: () => import('./review/lock-page.ts').then((m) => m.LockPage),
      },
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./app-not-found.ts').then((m) => m.NotFound),
      },
    ],
  },
];
