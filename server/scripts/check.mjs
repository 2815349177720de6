import { boot } from './start/boot.mjs';

await boot('test/check.ts');
