import { spawn } from 'node:child_process';
import { existsSync } from 'node:fs';
import { connect, createServer } from 'node:net';
import { startMailFake } from './mail-fake.mjs';
import { isDemo, nextBin, stop } from './settings.mjs';

const mode = process.argv[2] === 'dev' ? 'dev' : 'start';
const port = Number(process.env.PORT || 3000);
const host = process.env.HOST || (isDemo() ? '127.0.0.1' : '0.0.0.0');
const graceMs = 5000;

if (!Number.isInteger(port) || port < 1 || port > 65535)
  stop(`PORT is "${process.env.PORT}"; give a number, 1 to 65535.`);
if (isDemo() && !['127.0.0.1', 'localhost', '::1'].includes(host)) {
  stop(
    `While the demo is on its passwords are known, so it serves this machine only: unset HOST (${host}) or set ANTIPHON_DEMO=0.`,
  );
}
if (mode === 'start' && !existsSync('.next/BUILD_ID'))
  stop('There is no build yet: run `npm start`, which makes one.');
await requireFreePort();
if (isDemo() && !process.env.RESEND_API_KEY && !process.env.MAIL_URL)
  process.env.MAIL_URL = await startMailFake();

const args = ['--import', './scripts/with-parent.mjs', nextBin, mode, '-H', host, '-p', String(port)];
const server = spawn(process.execPath, args, { stdio: 'inherit' });
let leaving = false;

server.on('error', (error) => stop(`The server could not start: ${error.message}`));
server.on('exit', (code, signal) => {
  if (leaving) process.exit(0);
  stop(`The server ended by itself (${signal ?? `code ${code}`}).`);
});
for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP']) process.on(signal, leave);

// npm's shell dies of a SIGTERM without passing it on; the server must not outlive it and keep the port.
const parent = process.ppid;
setInterval(() => process.ppid === parent || leave(), 500).unref();

await answering();
announce();

function leave() {
  if (leaving) return;
  leaving = true;
  server.kill('SIGTERM');
  setTimeout(() => server.kill('SIGKILL'), graceMs).unref();
}

function requireFreePort() {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', ({ code, message }) =>
      stop(
        code === 'EADDRINUSE' ? `Port ${port} is in use: end what uses it, or set PORT to another.` : message,
      ),
    );
    probe.listen({ port, host, exclusive: true }, () => probe.close(resolve));
  });
}

async function answering() {
  const isOpen = () =>
    new Promise((resolve) => {
      const socket = connect(port, host === '0.0.0.0' ? '127.0.0.1' : host);
      socket.once('connect', () => resolve(socket.destroy() && true)).once('error', () => resolve(false));
    });
  while (!(await isOpen())) await new Promise((resolve) => setTimeout(resolve, 50));
}

function announce() {
  const lines = [`Antiphon is at http://localhost:${port}`];
  if (isDemo() && !process.env.STAGE) {
    lines.push(
      '',
      'The demo is on: an invented network, and these accounts, all with the password antiphon-demo',
      '  scheduler@antiphon.example      plans the sessions: start here',
      '  operator@arrowfell.example      operator of Af',
      '  operator@brightmoor.example     operator of Bm',
      '  correlator@antiphon.example     correlator staff',
      '  investigator@antiphon.example   principal investigator',
      '  admin@antiphon.example          administrator',
    );
  }
  console.log(`\n${lines.map((line) => (line ? `  ${line}` : '')).join('\n')}\n`);
}
