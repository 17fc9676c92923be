// `npm start`: from a fresh checkout to a running service with one command, and back to nothing with Ctrl-C.
// Until everything is prepared this file and what it imports need nothing but Node; the rest is loaded after that.
import { fileURLToPath } from 'node:url';
import { prepare } from './prepare.mjs';
import { readLaunchOptions } from './stack/read-launch-options.mjs';

const root = fileURLToPath(new URL('..', import.meta.url));

try {
  const options = readLaunchOptions({ words: process.argv.slice(2), environment: process.env, root });
  await prepare();
  const { runStack } = await import('./stack/run-stack.mjs');
  await runStack(options);
} catch (error) {
  process.stderr.write(`spinassay: ${error.message}\n`);
  process.exit(1);
}
