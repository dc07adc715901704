/**
 * `npm run bench [word ...]`: runs the benchmarks tests/bench/*.bench.ts whose names contain one of the words (all of
 * them without a word), each in a Node process of its own, on code bundled by Vite as the app's is: a test runner's
 * module wrappers would be measured along with the code. Garbage collection is exposed, for memory figures.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
const FOLDER = path.join(ROOT, 'tests/bench');
const OUTPUT = path.join(ROOT, '.cache/bench');
const ENDING = '.bench.ts';

/** @param {string[]} words */
function benchesNamed(words) {
  const files = existsSync(FOLDER) ? readdirSync(FOLDER).filter((file) => file.endsWith(ENDING)) : [];
  return files.filter((file) => words.length === 0 || words.some((word) => file.includes(word))).sort();
}

/** @param {string[]} files */
async function bundle(files) {
  await build({
    configFile: false,
    root: ROOT,
    logLevel: 'warn',
    publicDir: false,
    build: {
      ssr: true,
      target: 'node20',
      outDir: OUTPUT,
      emptyOutDir: true,
      rolldownOptions: {
        input: Object.fromEntries(files.map((file) => [file.slice(0, -ENDING.length), path.join(FOLDER, file)])),
        output: { entryFileNames: '[name].mjs' },
      },
    },
  });
}

async function main() {
  const words = process.argv.slice(2);
  const files = benchesNamed(words);
  if (files.length === 0)
    throw new Error(`No benchmark in tests/bench/ is called ${words.join(' or ') || `*${ENDING}`}.`);
  await bundle(files);
  for (const file of files) {
    const name = file.slice(0, -ENDING.length);
    console.log(`\n== ${name} ==`);
    const { status } = spawnSync(process.execPath, ['--expose-gc', path.join(OUTPUT, `${name}.mjs`)], {
      stdio: 'inherit',
    });
    if (status !== 0) process.exitCode = 1;
  }
}

await main();
