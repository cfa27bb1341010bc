import { Pool } from 'pg';
import { pino } from 'pino';
import { connect } from '@db/connect';
import { readConfig } from './config';
import { openFiles } from './core-services';
import { createApp } from './create-app';

const config = readConfig(process.env);
const log = pino({ level: config.LOG_LEVEL });
const sequelize = connect(config.DATABASE_URL);
const sessionPool = new Pool({ connectionString: config.DATABASE_URL, max: 4 });
sessionPool.on('error', (error) => log.warn({ err: error }, 'session connection lost'));
const files = openFiles(config);

const app = createApp({ config, log, sequelize, sessionPool, files, now: () => new Date() });
const server = app.listen(config.PORT, (error) => {
  if (error) {
    log.fatal({ err: error }, 'cannot listen');
    process.exit(1);
  }
  log.info({ port: config.PORT }, 'server listening');
});
// Slow clients may not hold a connection for the minutes that Node allows.
server.headersTimeout = 10_000;
server.requestTimeout = 60_000;

let stopping = false;
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  await new Promise((done) => {
    server.close(done);
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 5_000).unref();
  });
  await sequelize.close();
  await sessionPool.end();
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
