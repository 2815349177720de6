import { boot } from './start/boot.mjs';

await boot('prove/prove-start.ts');
