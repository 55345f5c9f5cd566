import { spawnSync } from 'node:child_process';
import { existsSync } from 'node:fs';

const usual = [
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
  '/snap/bin/chromium',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  'C:\\Program Files\\Google\\Chrome\\Application\\chrome.exe'
];

/** Path of an installed Chromium; null when there is none. CHROMIUM_PATH names another. */
export function findChromium() {
  const named = process.env.CHROMIUM_PATH;
  if (named) return existsSync(named) ? named : null;
  return usual.find((path) => existsSync(path)) ?? null;
}

/**
 * Installs Debian packages when this may be done; says so.
 * @param {string[]} packages
 */
function installDebian(packages) {
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) return;
  console.log(`Installing for the browser tests: ${packages.join(', ')} …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  spawnSync('apt-get', ['update', '-qq'], { stdio: 'ignore', env });
  spawnSync('apt-get', ['install', '-y', '-qq', ...packages], { stdio: 'ignore', env });
}

/** The two other engines of the smoke test; where they are missing, their tests say that they were skipped. */
export function provideOtherEngines() {
  const missing = [
    ...(existsSync('/usr/bin/firefox-esr') ? [] : ['firefox-esr']),
    ...(existsSync('/usr/bin/WebKitWebDriver') ? [] : ['webkit2gtk-driver']),
    ...(existsSync('/usr/bin/Xvfb') ? [] : ['xvfb'])
  ];
  if (missing.length > 0) installDebian(missing);
}

/** Finds a Chromium, or installs Debian's package when this may be done; else says what to do and returns null. */
export function provideChromium() {
  const found = findChromium();
  if (found) return found;
  installDebian(['chromium', 'fonts-noto-core']);
  const installed = findChromium();
  if (installed) return installed;
  console.error(
    'No Chromium was found for the browser tests. Install one (Debian, Ubuntu: sudo apt-get install chromium) or set CHROMIUM_PATH to its program file.'
  );
  return null;
}
