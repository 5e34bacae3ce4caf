/** The program behind `npm run dev`: pages are compiled as they are asked for, the worker whenever it changes. */
import { watchPrograms } from './build-programs';
import { startServer } from './start-server';

await watchPrograms();
await startServer({ development: true });
