/** `npm run verify`: the longer proof. Each property is tried fifty times as often as in `npm test`; minutes, not seconds. */
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { tools } from './paths.mjs';
import { main, run } from './processes.mjs';

const FACTOR = '50';
/** Specs whose properties take `runs()` of test/support/property-runs.ts. */
const SPECS = ['points-properties', 'wiring-properties', 'largest-k', 'apostrophe-guard', 'import-fuzz'];

await main(
  async () => {
    checkNodeVersion();
    await installPackages();
    const args = [tools.vitest, 'run', '--project', 'reference', '--project', 'server', '--project', 'integration', '--testTimeout', '3600000', ...SPECS];
    return (await run(process.execPath, args, { show: true, env: { ...process.env, PROPERTY_FACTOR: FACTOR } })).code;
  },
  { interruptedCode: 130 },
);
