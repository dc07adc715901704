import wasmUrl from 'highs/runtime?url';
import { createEngine, reusingSessions } from '../../src';
import { serveInWorker } from './workerScope';

serveInWorker(async () => reusingSessions(await createEngine({ locateFile: () => wasmUrl })));
