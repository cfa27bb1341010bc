import { spawn } from 'node:child_process';
import { closeSync, createWriteStream, existsSync, openSync, renameSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { Failure } from '../../db/cluster-failure.mjs';
import { local, root, say } from '../prepare/ground.mjs';
import { readable } from './readable-log.mjs';

const largestLog = 5_000_000;
const patience = 10_000;

/** Thrown inside the start-up when somebody has asked for the end meanwhile. */
export class Stopped extends Error {}

/** The processes of this start, each in a group of its own so that Ctrl-C reaches only us. */
export class Children {
  #all = new Map();
  #stopping = false;
  #crash;
  /** Resolves to a Failure when a process that should stay ends by itself. */
  crashed = new Promise((resolve) => {
    this.#crash = resolve;
  });

  get pids() {
    return [...this.#all.values()].map(({ pid }) => pid);
  }

  /** Runs one step to its end and gives its exit code. */
  async step(name, command, args, { log, env }) {
    const out = openSync(log, 'w');
    const child = this.#spawn(name, command, args, { env, stdio: ['ignore', out, out] });
    closeSync(out);
    const { code } = await child.ended;
    if (this.#stopping) throw new Stopped();
    return code ?? 1;
  }

  /** Starts a process that stays. Resolves at once, or when it says so where `saysReady`. */
  async stay(name, script, env, { saysReady = false } = {}) {
    const file = join(local, 'logs', `${name}.log`);
    if (existsSync(file) && statSync(file).size > largestLog) renameSync(file, `${file}.1`);
    const log = createWriteStream(file, { flags: 'a' });
    const stdio = ['ignore', 'pipe', 'pipe', ...(saysReady ? ['ipc'] : [])];
    const child = this.#spawn(name, process.execPath, ['--enable-source-maps', script], {
      env,
      stdio,
    });
    let last = '';
    for (const stream of [child.process.stdout, child.process.stderr]) {
      createInterface({ input: stream }).on('line', (line) => {
        const { text, grave } = readable(line);
        log.write(`${text}\n`);
        if (grave || /Error:/.test(text)) last = text;
        if (grave) say(`${name}: ${text}`);
      });
    }
    const ended = child.ended.then(({ code, signal }) => {
      log.end();
      if (this.#stopping) return;
      const why = last.trim() || signal || `exit code ${code}`;
      this.#crash(new Failure(`The ${name} stopped by itself: ${why} (its log: ${file})`));
    });
    if (!saysReady) return;
    await Promise.race([ended, new Promise((done) => child.process.once('message', done))]);
  }

  #spawn(name, command, args, { env, stdio }) {
    if (this.#stopping) throw new Stopped();
    const child = spawn(command, args, { cwd: root, env, stdio, detached: true });
    const entry = { pid: child.pid, process: child, ended: undefined };
    entry.ended = new Promise((resolve) => {
      child.once('error', (error) => resolve({ code: 1, signal: error.message }));
      child.once('exit', (code, signal) => resolve({ code, signal }));
    }).finally(() => this.#all.delete(name));
    this.#all.set(name, entry);
    return entry;
  }

  /** Nothing new starts from now on; steps end at once, then what stays, in the order given. */
  async stop(order) {
    this.#stopping = true;
    const steps = [...this.#all.keys()].filter((name) => !order.includes(name));
    await Promise.all(steps.map((name) => this.#end(name)));
    for (const name of order) await this.#end(name);
  }

  async #end(name) {
    const child = this.#all.get(name);
    if (!child) return;
    signalGroup(child.pid, 'SIGTERM');
    const late = setTimeout(() => signalGroup(child.pid, 'SIGKILL'), patience);
    await child.ended;
    clearTimeout(late);
    // What a step had started itself may outlive it.
    signalGroup(child.pid, 'SIGKILL');
  }
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // The whole group is gone already.
  }
}
