import { readToday } from '@shared/today/today-contract';
import type { Routes } from '../http/routes';
import { presentToday } from './present-today';

export function todayRoutes(routes: Routes): void {
  routes.on(readToday, ({ tenant, actor, now }) => presentToday(tenant, actor, now()));
}
