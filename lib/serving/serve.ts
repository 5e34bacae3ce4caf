/** The program behind `npm start`: serves what `npm run build` made. Bundled to `.build/serve.js`. */
import { startServer } from './start-server';

await startServer({ development: false });
