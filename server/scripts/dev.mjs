import { boot } from './start/boot.mjs';

await boot('dev/dev.ts');
