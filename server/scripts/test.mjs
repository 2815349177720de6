import { boot } from './start/boot.mjs';

await boot('test/run-all.ts');
