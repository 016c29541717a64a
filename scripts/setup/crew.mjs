import { spawn } from 'node:child_process';
import { root } from './places.mjs';
import { say } from './say.mjs';

const PATIENCE_MS = 8000;
const tether = new URL('./tether.mjs', import.meta.url).href;

/** The programs that one command has started: they end together, last started first, each by its own process id. */
export class Crew {
  #members = [];
  #closers = [];
  #ending;

  /** Starts a node program that ends with this command. */
  start(name, args, { env = process.env, show = true } = {}) {
    const child = spawn(process.execPath, ['--import', tether, ...args], {
      cwd: root,
      env,
      detached: true,
      stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    });
    const member = { name, child, output: '', ended: false };
    this.#members.push(member);
    const write = (chunk) => {
      member.output = (member.output + chunk).slice(-20_000);
      if (show)
        for (const line of String(chunk).split('\n')) if (line.trim()) say(`${name.padEnd(8)} | ${line}`);
    };
    child.stdout.on('data', write);
    child.stderr.on('data', write);
    child.once('exit', (code, signal) => this.#left(member, code, signal));
    return member;
  }

  /** Resolves when the program reports that it is ready. */
  ready(member) {
    return new Promise((resolve, reject) => {
      member.child.on('message', (message) => message === 'ready' && resolve());
      member.child.once('exit', () =>
        reject(new Error(`${member.name} ended before it was ready\n${member.output}`)),
      );
    });
  }

  /** Work to do after the programs have ended, such as stopping the database. */
  afterwards(close) {
    this.#closers.push(close);
  }

  /** Ends everything on Ctrl-C or a request to stop. */
  endOnSignals() {
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
      process.on(signal, () => void this.end('Ending ...').then(() => process.exit(0)));
    }
  }

  /** Called when a program ends that should go on. */
  onLoss = (member, how) => {
    void this.end(`${member.name} ended by itself (${how}); ending the rest.`, member.output).then(() =>
      process.exit(1),
    );
  };

  #left(member, code, signal) {
    member.ended = true;
    if (!this.#ending) this.onLoss(member, signal ?? `exit code ${code}`);
  }

  get isEnding() {
    return this.#ending !== undefined;
  }

  end(reason, lastOutput) {
    this.#ending ??= this.#endAll(reason, lastOutput);
    return this.#ending;
  }

  async #endAll(reason, lastOutput) {
    if (reason) say(`\n${reason}`);
    if (lastOutput) say(lastOutput.trimEnd().split('\n').slice(-20).join('\n'));
    for (const member of [...this.#members].reverse()) await endMember(member);
    for (const close of this.#closers.reverse()) await close();
  }
}

async function endMember(member) {
  if (member.ended) return;
  const gone = new Promise((resolve) => member.child.once('exit', resolve));
  member.child.kill('SIGTERM');
  const timer = setTimeout(() => member.child.kill('SIGKILL'), PATIENCE_MS);
  await gone;
  clearTimeout(timer);
}
