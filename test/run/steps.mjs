import { readFileSync } from 'node:fs';

const scripts = JSON.parse(readFileSync('package.json', 'utf8')).scripts;

const npm = (name, script) => ({ name, command: 'npm', args: ['run', '--silent', script] });
const node = (name, ...args) => ({ name, command: process.execPath, args });
const jest = (name, project, ...more) => ({
  ...node(name, 'node_modules/jest/bin/jest.js', '--ci', `--selectProjects=${project}`, ...more),
  report: `.local/jest-${project}.json`,
});

/** What can be said without running the product: each counts as one check. */
export const checks = [
  npm('types of the server', 'types:server'),
  npm('types of the client', 'types:client'),
  npm('lint', 'lint:code'),
  npm('import rule and cycles', 'lint:imports'),
  npm('format', 'format:check'),
  node('translations', 'client/src/locale/merge.mjs', '--check'),
  npm('schema drift', 'schema:check'),
  ...(scripts['contract:check'] ? [npm('contract drift', 'contract:check')] : []),
];

/** Run two at a time, in this order: the long ones first. */
export const tests = [
  jest('server, shared and reference specs', 'server'),
  jest('client specs', 'client'),
  node('build of the client', 'deploy/build-client.mjs'),
  node('build of the server', 'deploy/build-server.mjs'),
];

/** Run alone at the end: they need the builds, and watch the clock. */
export const journeys = [jest('browser journeys', 'journeys', '--runInBand')];
