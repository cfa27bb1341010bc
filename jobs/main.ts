import cron from 'node-cron';
import { runDue } from './run-due';
import { workerServices } from './services';
import { timetable } from './timetable';

/**
 * The worker process. node-cron ticks in UTC, as a local clock skips and repeats hours; what is due,
 * and who does it, is decided in PostgreSQL, so any number of these may run.
 */
const services = workerServices(process.env);
const { log } = services;
let busy: Promise<unknown> | undefined;

function tick(): void {
  // A long job may outlast a tick; the next one finds whatever is due then.
  busy ??= runDue(services, timetable).finally(() => {
    busy = undefined;
  });
}

const ticking = cron.schedule('*/5 * * * * *', tick, { timezone: 'Etc/UTC' });
log.info({ jobs: timetable.map(({ name }) => name) }, 'worker started');

let stopping = false;
async function stop(): Promise<void> {
  if (stopping) return;
  stopping = true;
  await ticking.stop();
  await busy;
  await services.sequelize.close();
  services.files.destroy();
}
process.on('SIGTERM', () => void stop());
process.on('SIGINT', () => void stop());
