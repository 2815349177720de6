import { boot } from './start/boot.mjs';

await boot('test/runAll.ts');
