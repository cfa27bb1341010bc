import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { root, say } from '../prepare/ground.mjs';

/** The words at the end of the start: where to go and as whom to sign in. */
export async function announce({ port, own, env }, seconds) {
  const lines = [
    '',
    `Vatwright is ready (${seconds} s).`,
    '',
    `  Application   ${env.BASE_URL ?? `http://localhost:${port}`}`,
    ...(own.mail
      ? [`  Mail          http://localhost:${port + 3}  (what it sends ends here)`]
      : []),
    ...(own.cluster ? await signIns() : []),
    '',
    'Ctrl-C stops all of it.',
  ];
  say(lines.join('\n'));
}

async function signIns() {
  const file = join(root, 'db/seeds/demo-sign-ins.mjs');
  if (!existsSync(file)) return [];
  const module = await import(pathToFileURL(file).href);
  const people = Object.values(module).find(Array.isArray) ?? [];
  const passwords = new Set(people.map(({ password }) => password));
  const one = passwords.size === 1;
  const width = (key) => Math.max(...people.map((it) => it[key].length));
  const rows = people.map(({ email, password, role, name }) =>
    [
      `  ${role.padEnd(width('role'))}`,
      email.padEnd(width('email')),
      name,
      ...(one ? [] : [password]),
    ].join('  '),
  );
  return [
    '',
    `Sign in to the demo world${one ? ` with the password ${[...passwords][0]}` : ''} as`,
    ...rows,
  ];
}
