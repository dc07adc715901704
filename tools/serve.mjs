/**
 * Serves the built app from dist/ on this machine only, with the security headers on every response.
 * `node tools/serve.mjs`: PORT or 4173, the next free one if that is taken; HOST or 127.0.0.1.
 */
import { existsSync } from 'node:fs';
import { createServer } from 'node:http';
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import sirv from 'sirv';
import { SECURITY_HEADERS } from './contentSecurityPolicy.mjs';

export const DIST = fileURLToPath(new URL('../dist', import.meta.url));

const FIRST_PORT = 4173;
const PORTS_TRIED = 50;

/**
 * @typedef {object} ServerOptions
 * @property {string} [folder] default: dist
 * @property {string} [host] default: 127.0.0.1
 * @property {number} [port] default: 0, any free port
 * @property {(pathname: string) => Record<string, string>} [headersFor] default: the security headers, for every path
 */

/** Files under assets/ carry a hash of their content in their name, so they never change. @param {string} pathname */
function cacheControl(pathname) {
  return pathname.startsWith('/assets/') ? 'public, max-age=31536000, immutable' : 'no-cache';
}

/** Starts a server and resolves when it listens. @param {ServerOptions} [options] */
export async function startServer({
  folder = DIST,
  host = '127.0.0.1',
  port = 0,
  headersFor = () => SECURITY_HEADERS,
} = {}) {
  // Not in `dev` mode sirv reads the list of files once and serves only those: no path can climb out of the folder.
  const serveFile = sirv(folder, {
    etag: true,
    setHeaders: (response, pathname) => void response.setHeader('Cache-Control', cacheControl(pathname)),
  });
  const server = createServer((request, response) => {
    const pathname = (request.url ?? '/').split('?')[0];
    for (const [name, value] of Object.entries(headersFor(pathname))) response.setHeader(name, value);
    if (request.method !== 'GET' && request.method !== 'HEAD') {
      response.writeHead(405, { Allow: 'GET, HEAD' }).end();
      return;
    }
    serveFile(request, response, () => {
      response.writeHead(404, { 'Content-Type': 'text/plain; charset=utf-8' }).end('There is no such file here.\n');
    });
  });
  await /** @type {Promise<void>} */ (
    new Promise((resolve, reject) => {
      server.once('error', reject);
      server.listen(port, host, resolve);
    })
  );
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The server has no port.');
  return {
    url: `http://${host.includes(':') ? `[${host}]` : host}:${address.port}`,
    async close() {
      server.closeAllConnections();
      await new Promise((resolve) => server.close(resolve));
    },
  };
}

/** The first free port from `port` on. @param {string} host @param {number} port */
async function startOnFreePort(host, port) {
  for (let candidate = port; ; candidate += 1) {
    try {
      return await startServer({ host, port: candidate });
    } catch (error) {
      const taken = error instanceof Error && 'code' in error && error.code === 'EADDRINUSE';
      if (!taken || candidate - port >= PORTS_TRIED) throw error;
    }
  }
}

/** @param {string | undefined} text */
function readPort(text) {
  const port = text === undefined || text === '' ? FIRST_PORT : Number(text);
  if (!Number.isInteger(port) || port < 0 || port > 65_535) {
    throw new Error(`PORT must be a whole number from 0 to 65535, not "${text}".`);
  }
  return port;
}

async function main() {
  if (!existsSync(path.join(DIST, 'index.html'))) {
    throw new Error(
      'There is no built app in dist/. Run "npm run build" first, or "npm start", which builds and serves.',
    );
  }
  const server = await startOnFreePort(process.env.HOST ?? '127.0.0.1', readPort(process.env.PORT));
  console.log(`\n  Basewright is at ${server.url}/\n\n  It runs on this machine only. Stop it with Ctrl+C.\n`);
}

if (process.argv[1] !== undefined && import.meta.url === pathToFileURL(process.argv[1]).href) {
  main().catch((error) => {
    console.error(error instanceof Error ? error.message : error);
    process.exitCode = 1;
  });
}
