/** `npm test`: sets the machine up, then runs every step; each can be run alone (see DEVELOPERS.md). */
import { prepare } from './prepare.mjs';

prepare(['postgresql', 'chromium']);
const { register } = await import('tsx/esm/api');
register();
await import('../../tests/run.ts');
