import cookieParser from 'cookie-parser';
import compression from 'compression';
import express, { type Express } from 'express';
import pinoHttp from 'pino-http';
import { randomUUID } from 'node:crypto';
import { registerFeatures } from './features';
import { healthRoutes } from './health/health-routes';
import { crossSiteDefence } from './http/cross-site-defence';
import { nothingHere, problemHandler } from './http/problem-handler';
import { Routes } from './http/routes';
import { securityHeaders } from './http/security-headers';
import type { Services } from './http/services';
import './http/signed-in-user';
import { serveClient } from './http/serve-client';
import { sessions } from './sign-in/sessions';

/** The whole HTTP stack in order. */
export function createApp(services: Services): Express {
  const { config, log } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.TRUST_PROXY_HOPS);
  app.use(pinoHttp({ logger: log, genReqId: () => randomUUID(), quietReqLogger: true }));
  app.use(healthRoutes(services));
  app.use(securityHeaders(config));
  app.use(compression());

  const api = express.Router();
  api.use((_req, res, next) => {
    res.set('Cache-Control', 'no-store');
    next();
  });
  api.use(express.json({ limit: '1mb' }));
  api.use(cookieParser());
  api.use(...sessions(services));
  api.use(crossSiteDefence(config));
  registerFeatures(new Routes(api, services));
  api.use(nothingHere);

  app.use('/api/v1', api);
  app.use(serveClient());
  app.use(nothingHere);
  app.use(problemHandler(log));
  return app;
}
