import { createReadStream, existsSync, statSync } from 'node:fs';
import { createServer } from 'node:http';
import { extname, join, normalize } from 'node:path';

/**
 * The headers a host should send with the built app. The content security policy itself stands in each page (hashes of
 * its own inline script); what a page cannot say about itself stands here.
 */
export const productionHeaders = {
  'Content-Security-Policy': "frame-ancestors 'none'",
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Cross-Origin-Resource-Policy': 'same-origin',
  'Permissions-Policy':
    'camera=(self), serial=(self), screen-wake-lock=(self), geolocation=(), microphone=(), payment=(), usb=()'
};

/** @type {Record<string, string>} */
const types = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.mjs': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.webmanifest': 'application/manifest+json',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.wasm': 'application/wasm',
  '.woff2': 'font/woff2',
  '.txt': 'text/plain; charset=utf-8'
};

/**
 * Serves a built app: files as they are, every other path with the fallback page, as a static host is to be set up.
 * @param {string} folder
 * @param {(path: string) => string | 'missing' | null} [instead] another body for a path, or a 404; null: the file
 * @returns {import('node:http').Server}
 */
export function serveFolder(folder, instead = () => null) {
  return createServer((request, response) => {
    const path = decodePath(request.url ?? '/');
    if (path === null) {
      response.writeHead(400, productionHeaders).end();
      return;
    }
    const other = instead(path);
    if (other === 'missing') {
      response.writeHead(404, productionHeaders).end();
      return;
    }
    if (other !== null) {
      response.writeHead(200, {
        ...productionHeaders,
        'Content-Type': types[extname(path)] ?? '',
        'Cache-Control': 'no-cache'
      });
      response.end(other);
      return;
    }
    let file = join(folder, normalize(path));
    if (!file.startsWith(folder) || !existsSync(file) || statSync(file).isDirectory()) {
      if (extname(path) !== '' && path !== '/') {
        response.writeHead(404, { ...productionHeaders, 'Content-Type': 'text/plain' }).end('Not found');
        return;
      }
      file = join(folder, 'index.html');
    }
    const forEver = path.includes('/_app/immutable/');
    response.writeHead(200, {
      ...productionHeaders,
      'Content-Type': types[extname(file)] ?? 'application/octet-stream',
      'Cache-Control': forEver ? 'public, max-age=31536000, immutable' : 'no-cache'
    });
    if (request.method === 'HEAD') response.end();
    else createReadStream(file).pipe(response);
  });
}

/** @param {string} url */
function decodePath(url) {
  try {
    return decodeURIComponent(new URL(url, 'http://localhost').pathname);
  } catch {
    return null;
  }
}

/**
 * Listens on the first free port from `port` on; 0 takes any.
 * @param {import('node:http').Server} server
 * @param {number} port
 * @param {string} host
 * @returns {Promise<number>}
 */
export function listen(server, port, host = 'localhost') {
  return new Promise((resolve, reject) => {
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      if (error.code === 'EADDRINUSE' && port !== 0 && port < 65_000) resolve(listen(server, port + 1, host));
      else reject(error);
    });
    server.listen(port, host, () => {
      const address = server.address();
      resolve(typeof address === 'object' && address ? address.port : port);
    });
  });
}
