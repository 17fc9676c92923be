import { lstat, rm } from 'node:fs/promises';
import { createConnection, createServer } from 'node:net';

/** Each round either ends or removes what a dead process left; more rounds than processes that start at once are not needed. */
const roundCountMax = 10;

/**
 * Take a lock between processes of one machine, or learn who holds it.
 *
 * The holder listens on a Unix socket, so the system lets go of the lock when its process ends in whatever way: a number in a file would
 * outlive a kill, and come to name a stranger. A holder tells its process id to whoever connects and keeps the connection until it lets go.
 *
 * @param {string} socketPath at most 103 bytes, in a folder that exists and that only this user can enter
 * @returns {Promise<{isTaken: true, release(): Promise<void>} | {isTaken: false, holderPid: number, untilReleased(): Promise<void>}>}
 */
export async function takeLock(socketPath) {
  for (let round = 0; round < roundCountMax; round += 1) {
    const server = await listen(socketPath);
    if (server !== undefined) return { isTaken: true, release: () => release(server) };
    const holder = await askHolder(socketPath);
    if (holder !== undefined) return { isTaken: false, ...holder };
  }
  throw new Error(`could not take the lock ${socketPath}; remove it if no process of this service runs`);
}

/** undefined when there is a socket of that name already, alive or dead. */
function listen(socketPath) {
  return new Promise((resolve, reject) => {
    const connections = new Set();
    const server = createServer((socket) => {
      connections.add(socket);
      socket.on('close', () => connections.delete(socket));
      socket.on('error', () => {}); // Whoever asked is gone; nothing was owed.
      socket.write(`${process.pid}\n`);
    });
    server.on('error', (error) => (error.code === 'EADDRINUSE' ? resolve(undefined) : reject(error)));
    server.listen(socketPath, () => {
      server.unref(); // Holding a lock keeps no process alive.
      resolve({ server, connections });
    });
  });
}

/** undefined when nobody listens any more: then the socket is removed, unless it has become another one meanwhile. */
async function askHolder(socketPath) {
  const before = await lstat(socketPath).catch(() => undefined);
  const socket = createConnection(socketPath);
  const released = new Promise((resolve) => socket.once('close', () => resolve()));
  const holderPid = await new Promise((resolve) => {
    socket.once('data', (line) => resolve(Number(line)));
    socket.once('error', () => resolve(undefined));
    socket.once('end', () => resolve(undefined));
  });
  if (holderPid !== undefined) {
    socket.unref(); // Knowing who holds it keeps no process alive; waiting for it does.
    const untilReleased = () => {
      socket.ref();
      return released;
    };
    return { holderPid, untilReleased };
  }
  socket.destroy();
  const after = await lstat(socketPath).catch(() => undefined);
  if (after !== undefined && after.ino === before?.ino) await rm(socketPath, { force: true });
  return undefined;
}

/** The server removes its socket file as it closes; those who wait are told by the end of their connection. */
function release({ server, connections }) {
  return new Promise((resolve) => {
    server.close(() => resolve());
    for (const socket of connections) socket.destroy();
  });
}
