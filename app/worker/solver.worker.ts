import wasmUrl from 'highs/runtime?url';
import { createHighsEngine } from '../../src';
import { serveInWorker } from './workerScope';

serveInWorker(() => createHighsEngine({ locateFile: () => wasmUrl }));
