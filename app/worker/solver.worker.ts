import wasmUrl from 'highs/runtime?url';
import { createHighsEngine, reusingSessions } from '../../src';
import { serveInWorker } from './workerScope';

serveInWorker(async () => reusingSessions(await createHighsEngine({ locateFile: () => wasmUrl })));
