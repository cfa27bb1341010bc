import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { Failure } from '../../db/cluster-failure.mjs';
import { installPackages, isRoot } from './debian.mjs';
import { say } from './ground.mjs';

/** The browser of the journeys: `CHROMIUM_PATH`, or Debian's Chromium. */
export function chromiumPath() {
  const given = process.env.CHROMIUM_PATH;
  if (given) return existsSync(given) ? given : undefined;
  return ['/usr/bin/chromium', join('/usr/bin', 'chromium-browser')].find((it) => existsSync(it));
}

/** Chromium from Debian's packages, where the machine has none. */
export function prepareChromium() {
  if (chromiumPath()) return;
  if (!isRoot) {
    throw new Failure(
      'The browser tests need Chromium: have it installed (apt-get install chromium), or name one in CHROMIUM_PATH.',
    );
  }
  say("Installing Chromium from Debian's packages …");
  installPackages('Chromium', ['chromium'], 'chromium.log');
}
