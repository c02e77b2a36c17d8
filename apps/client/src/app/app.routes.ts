import type { Routes } from '@angular/router';
import { projectGuard } from './core/project/project-guard';
import { signedInGuard } from './core/session/signed-in-guard';

/** Pages of one project, under `/projects/:projectId`. */
const projectPages: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'overview' },
  { path: 'overview', title: 'Overview', loadComponent: () => import('./projects/overview-page/overview-page').then((m) => m.OverviewPage) },
  { path: 'points', title: 'Points and doses', loadComponent: () => import('./points/points-page/points-page').then((m) => m.PointsPage) },
  { path: 'mapping', title: 'I/O mapping', loadComponent: () => import('./mapping/mapping-page/mapping-page').then((m) => m.MappingPage) },
  { path: 'hardware', title: 'Hardware and wiring', loadComponent: () => import('./hardware/hardware-page/hardware-page').then((m) => m.HardwarePage) },
  { path: 'findings', title: 'Findings', loadComponent: () => import('./findings/findings-page/findings-page').then((m) => m.FindingsPage) },
  { path: 'import', title: 'Import', loadComponent: () => import('./imports/import-page/import-page').then((m) => m.ImportPage) },
  { path: 'lanes/:dispenserId', title: 'Lane', loadComponent: () => import('./lanes/lane-page/lane-page').then((m) => m.LanePage) },
  { path: 'history', title: 'History', loadComponent: () => import('./history/history-page/history-page').then((m) => m.HistoryPage) },
];

export const routes: Routes = [
  { path: 'sign-in', title: 'Sign in', loadComponent: () => import('./accounts/sign-in-page/sign-in-page').then((m) => m.SignInPage) },
  {
    path: '',
    canActivate: [signedInGuard],
    loadComponent: () => import('./core/shell/shell').then((m) => m.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'projects' },
      { path: 'projects', title: 'Projects', loadComponent: () => import('./projects/project-list-page/project-list-page').then((m) => m.ProjectListPage) },
      { path: 'catalogue', title: 'Catalogue', loadComponent: () => import('./catalogue/catalogue-page/catalogue-page').then((m) => m.CataloguePage) },
      { path: 'projects/:projectId', canActivate: [projectGuard], children: projectPages },
    ],
  },
  { path: '**', redirectTo: 'projects' },
];
