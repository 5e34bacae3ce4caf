/** The command `npm run build`. */
import { buildAll } from './build-all';

await buildAll();
