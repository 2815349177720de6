import { boot } from './start/boot.mjs';

await boot('prove/proveStart.ts');
