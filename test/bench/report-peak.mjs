/** Preloaded into a measured process: writes its peak resident memory, KiB, as it ends. */
import { writeFileSync } from 'node:fs';

process.on('exit', () => writeFileSync(process.env.PEAK_REPORT, String(process.resourceUsage().maxRSS)));
