// npm start: installs what is missing, builds, serves the production build and prints the address.
import { spawnSync } from 'node:child_process';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { installWhenMissing, requireNode } from './install.mjs';
import { listen, serveFolder } from './serve.mjs';

const root = join(dirname(fileURLToPath(import.meta.url)), '../..');
requireNode();
installWhenMissing(root);

console.log('Building …');
const built = spawnSync(
  process.execPath,
  [join(root, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'],
  {
    cwd: root,
    stdio: 'inherit'
  }
);
if (built.status !== 0) {
  console.error('The build failed; the lines above say where.');
  process.exit(1);
}

const host = process.env.HOST ?? 'localhost';
const port = await listen(serveFolder(join(root, 'build')), Number(process.env.PORT ?? 4173), host);
console.log(`
  Evenload is at  http://${host}:${port}/
  The demo is one tap away: "Look around with the demo".
  Stop with Ctrl+C.
`);
