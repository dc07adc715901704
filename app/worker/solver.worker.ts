import wasmUrl from 'highs/runtime?url';
import { createEngine } from '../../src';
import { serveInWorker } from './workerScope';

serveInWorker(async () => createEngine({ locateFile: () => wasmUrl }));
