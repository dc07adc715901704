import { createJavascriptEngine } from '../../src';
import { serveInWorker } from './workerScope';

/** The engine where WebAssembly is not allowed. It can hang on a rare program, so it has a worker that can be killed. */
serveInWorker(async () => createJavascriptEngine());
