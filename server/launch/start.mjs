/** `npm start`, and `npm run dev` with the word "dev": sets the machine up, then hands over. */
import { prepare } from './prepare.mjs';

prepare(['postgresql']);
const { register } = await import('tsx/esm/api');
register();
await (process.argv[2] === 'dev' ? import('./dev.ts') : import('./start.ts'));
