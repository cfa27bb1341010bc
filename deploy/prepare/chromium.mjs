import { existsSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { librariesUnder } from '../../db/cluster-programs.mjs';
import { installPackages, isRoot, unpackPackages } from './debian.mjs';
import { root, say } from './ground.mjs';

const unpacked = join(root, '.local/debian-chromium');
const launcher = join(unpacked, 'launch-chromium');

/** The browser of the journeys: `CHROMIUM_PATH`, or Debian's Chromium. */
export function chromiumPath() {
  const given = process.env.CHROMIUM_PATH;
  return [given, '/usr/bin/chromium', launcher].find((it) => it && existsSync(it));
}

/** Chromium from Debian's packages, where the machine has none. */
export function prepareChromium() {
  if (chromiumPath()) return;
  say("Installing Chromium from Debian's packages …");
  const names = ['chromium', 'fonts-liberation'];
  if (isRoot) {
    installPackages('Chromium', names, 'chromium.log');
  } else {
    unpackPackages('Chromium', names, unpacked, 'chromium.log');
    writeLauncher();
  }
}

/** Debian's own launcher looks for everything in the machine's folders. */
function writeLauncher() {
  const { LD_LIBRARY_PATH } = librariesUnder(unpacked);
  const script = `#!/bin/sh
export LD_LIBRARY_PATH='${LD_LIBRARY_PATH}'
export FONTCONFIG_FILE='${join(unpacked, 'fonts.conf')}'
exec '${join(unpacked, 'usr/lib/chromium/chromium')}' "$@"
`;
  const fonts = `<?xml version="1.0"?>
<fontconfig>
  <dir>${join(unpacked, 'usr/share/fonts')}</dir>
  <dir>/usr/share/fonts</dir>
  <cachedir>${join(unpacked, 'font-cache')}</cachedir>
</fontconfig>
`;
  writeFileSync(join(unpacked, 'fonts.conf'), fonts);
  writeFileSync(launcher, script, { mode: 0o755 });
}
