import type { Routes } from '@angular/router';
import { can } from '../session/session-guard';
import { leaveUnsaved } from '../ui/confirm-dialog/leave-unsaved-guard';

const ruleEditor = () => import('./rule-editor/rule-editor').then((m) => m.RuleEditor);

const routes: Routes = [
  {
    path: '',
    title: $localize`:@@programmes.title:Programmes`,
    canActivate: [can('programmes.read')],
    loadComponent: () => import('./programme-list/programme-list').then((m) => m.ProgrammeList),
  },
  {
    path: ':id',
    canActivate: [can('programmes.read')],
    loadComponent: () => import('./programme-page/programme-page').then((m) => m.ProgrammePage),
  },
  {
    path: ':id/rules/new',
    title: $localize`:@@programmes.new-rule:New rule`,
    canActivate: [can('programmes.edit')],
    canDeactivate: [leaveUnsaved],
    loadComponent: ruleEditor,
  },
  {
    path: ':id/rules/:ruleId',
    title: $localize`:@@programmes.rule:Rule`,
    canActivate: [can('programmes.read')],
    canDeactivate: [leaveUnsaved],
    loadComponent: ruleEditor,
  },
];

export default routes;
