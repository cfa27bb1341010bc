import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Router } from 'express';
import type { Services } from '../http/services';

/** `/health/live`: the process answers. `/health/ready`: everything a person needs is there. */
export function healthRoutes({ sequelize, log, config }: Services): Router {
  const router = Router();
  router.get('/health/live', (_req, res) => {
    res.json({ status: 'live' });
  });
  router.get('/health/ready', async (_req, res) => {
    try {
      await sequelize.query('SELECT 1');
    } catch (error) {
      log.warn({ err: error }, 'not ready');
      res.status(503).json({ status: 'waiting for the database' });
      return;
    }
    const built = existsSync(join(process.cwd(), 'dist/client/browser/en/index.html'));
    if (!built && config.NODE_ENV !== 'test') {
      res.status(503).json({ status: 'waiting for the client to be built' });
      return;
    }
    res.json({ status: 'ready' });
  });
  return router;
}
