/**
 * Ports of this machine, without ss or netstat, which a small Debian lacks.
 *
 *   node port.mjs free              prints a free port of 127.0.0.1 from 20000 to 29999: below the range that
 *                                   Linux hands out by itself, so that a stored port stays ours
 *   node port.mjs check HOST PORT   exit status 0 free, 3 in use, 4 not allowed, 5 no such address here, 2 not a port
 */
import { createServer } from 'node:net';

const STATUS_OF = { EADDRINUSE: 3, EACCES: 4, EADDRNOTAVAIL: 5, ENOTFOUND: 5 };

function statusOf(host, port) {
  return new Promise((resolve) => {
    const probe = createServer();
    probe.once('error', (error) => resolve(STATUS_OF[error.code] ?? 1));
    probe.listen({ host, port, exclusive: true }, () => probe.close(() => resolve(0)));
  });
}

async function freePort() {
  for (let tries = 0; tries < 200; tries += 1) {
    const port = 20000 + Math.floor(Math.random() * 10000);
    if ((await statusOf('127.0.0.1', port)) === 0) return port;
  }
  throw new Error('no free port of 127.0.0.1 between 20000 and 29999');
}

const [command, host, given] = process.argv.slice(2);
if (command === 'free') {
  // not console.log, which colours a number where FORCE_COLOR is set
  process.stdout.write(`${await freePort()}\n`);
} else if (command === 'check') {
  const port = /^\d{1,5}$/.test(given ?? '') ? Number(given) : 0;
  process.exitCode = port >= 1 && port <= 65535 ? await statusOf(host, port) : 2;
} else {
  console.error('usage: node port.mjs free | check HOST PORT');
  process.exitCode = 64;
}
