import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';

const require = createRequire(import.meta.url);

/** The script file behind a command of an installed package, to be run by Node without a shell. @param {string} packageName @param {string} [command] */
export function binOf(packageName, command = packageName) {
  const manifest = require.resolve(`${packageName}/package.json`);
  const { bin } = JSON.parse(readFileSync(manifest, 'utf8'));
  const file = typeof bin === 'string' ? bin : bin?.[command];
  if (!file) throw new Error(`The package ${packageName} has no command ${command}.`);
  return path.join(path.dirname(manifest), file);
}
