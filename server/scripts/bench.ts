import { benchReading } from './bench/reading.ts';

/** What can be measured: `npm run bench -- reading`. Each prints ratios taken within one run, so that machines compare. */
const BENCHES: Record<string, () => void> = { reading: benchReading };

const name = process.argv[2] ?? '';
const bench = BENCHES[name];
if (!bench) {
  process.stderr.write(`Say what to measure: npm run bench -- ${Object.keys(BENCHES).join(' | ')}\n`);
  process.exitCode = 2;
} else bench();
