import { existsSync } from 'node:fs';
import path from 'node:path';
import { DIST, startServer } from '../../tools/serve.mjs';

/** The variable that carries the address of the built app to the journeys. */
export const APP_URL = 'BASEWRIGHT_URL';

export default async function globalSetup(): Promise<() => Promise<void>> {
  if (!existsSync(path.join(DIST, 'index.html'))) {
    throw new Error('The journeys run on the built app, and there is none in dist/. Run "npm run build" first.');
  }
  const server = await startServer();
  process.env[APP_URL] = server.url;
  return () => server.close();
}
