import { spawnSync } from 'node:child_process';
import { existsSync, statSync } from 'node:fs';

/**
 * Installs the locked dependencies when they are missing or older than the lock file.
 * @param {string} root
 */
export function installWhenMissing(root) {
  const installed = `${root}/node_modules/.package-lock.json`;
  const fresh = existsSync(installed) && statSync(installed).mtimeMs >= statSync(`${root}/package-lock.json`).mtimeMs;
  if (fresh) return;
  console.log('Installing the locked dependencies …');
  const { status } = spawnSync('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], {
    cwd: root,
    stdio: 'inherit',
    shell: process.platform === 'win32'
  });
  if (status !== 0) {
    console.error(
      'The dependencies could not be installed. Nothing was changed. Check the network and the npm registry, then try again.'
    );
    process.exit(1);
  }
}

/** Stops with a sentence on a Node that is too old. */
export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  console.error(`Evenload needs Node.js 20.19 or later; this is ${process.versions.node}.`);
  process.exit(1);
}
