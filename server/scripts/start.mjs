import { boot } from './start/boot.mjs';

await boot('start/app.ts');
