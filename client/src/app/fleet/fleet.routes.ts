import type { Routes } from '@angular/router';
import { leaveUnsaved } from '../procedures/editor/leave-unsaved-guard';
import { can } from '../session/session-guard';

const groups = () => import('./group-list/group-list').then((m) => m.GroupList);
const storeForm = () => import('./store-form/store-form').then((m) => m.StoreFormPage);
const unitForm = () => import('./unit-form/unit-form').then((m) => m.UnitFormPage);

const writing = { canActivate: [can('fleet.edit')], canDeactivate: [leaveUnsaved] };
const reading = { canActivate: [can('fleet.read')] };

const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'stores' },
  {
    path: 'stores',
    title: $localize`:@@fleet.stores:Stores`,
    ...reading,
    loadComponent: () => import('./store-list/store-list').then((m) => m.StoreList),
  },
  {
    path: 'stores/new',
    title: $localize`:@@fleet.new-store:New store`,
    ...writing,
    loadComponent: storeForm,
  },
  {
    path: 'stores/:id',
    ...reading,
    loadComponent: () => import('./store-page/store-page').then((m) => m.StorePage),
  },
  {
    path: 'stores/:id/edit',
    title: $localize`:@@fleet.edit-store:Edit a store`,
    ...writing,
    loadComponent: storeForm,
  },
  {
    path: 'units',
    title: $localize`:@@fleet.units:Units`,
    ...reading,
    loadComponent: () => import('./unit-list/unit-list').then((m) => m.UnitList),
  },
  {
    path: 'units/new',
    title: $localize`:@@fleet.new-unit:New unit`,
    ...writing,
    loadComponent: unitForm,
  },
  {
    path: 'units/:id',
    ...reading,
    loadComponent: () => import('./unit-page/unit-page').then((m) => m.UnitPage),
  },
  {
    path: 'units/:id/edit',
    title: $localize`:@@fleet.edit-unit:Edit a unit`,
    ...writing,
    loadComponent: unitForm,
  },
  {
    path: 'parts',
    title: $localize`:@@fleet.parts:Parts`,
    ...reading,
    loadComponent: () => import('./part-list/part-list').then((m) => m.PartList),
  },
  {
    path: 'chains',
    title: $localize`:@@fleet.chains:Chains`,
    data: { kind: 'chains' },
    ...reading,
    loadComponent: groups,
  },
  {
    path: 'regions',
    title: $localize`:@@fleet.regions:Regions`,
    data: { kind: 'regions' },
    ...reading,
    loadComponent: groups,
  },
  { path: 'imports', loadChildren: () => import('../imports/imports.routes') },
];

export default routes;
