import { createConnection } from 'node:net';

/** Protocol 3.0, `PostgreSQL documentation, Message Formats, StartupMessage`. */
const protocolVersion = 196_608;
/** SQLSTATE cannot_connect_now: the server starts, stops or recovers. */
const cannotConnectNow = '57P03';
const answerMillisecondsMax = 2_000;

/**
 * Ask whether a server answers on a Unix socket, without a driver: send a startup message and look at the first byte of the answer.
 *
 * @param {{socketPath: string, user: string, database: string}} address
 * @returns {Promise<'absent' | 'starting' | 'answers'>}
 */
export function probeServer({ socketPath, user, database }) {
  return new Promise((resolve) => {
    const socket = createConnection(socketPath);
    const finish = (state) => {
      socket.destroy();
      resolve(state);
    };
    socket.setTimeout(answerMillisecondsMax, () => finish('starting'));
    socket.on('error', () => finish('absent')); // No file, or nobody behind it.
    socket.on('close', () => finish('starting'));
    socket.on('connect', () => socket.write(startupMessage({ user, database })));
    socket.once('data', (answer) => finish(isNotReady(answer) ? 'starting' : 'answers'));
  });
}

function startupMessage(parameters) {
  const words = Object.entries(parameters).flat();
  const body = Buffer.from(`${words.join('\0')}\0\0`, 'utf8');
  const head = Buffer.alloc(8);
  head.writeInt32BE(head.length + body.length, 0);
  head.writeInt32BE(protocolVersion, 4);
  return Buffer.concat([head, body]);
}

/** 'E' is an error response, whose field 'C' is the SQLSTATE. Any other error (no such database) comes from a server that is up. */
const isNotReady = (answer) => answer[0] === 0x45 && answer.includes(`C${cannotConnectNow}\0`);
