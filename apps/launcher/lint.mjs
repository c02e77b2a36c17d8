/** `npm run lint`: ESLint over everything; further arguments are passed on (`npm run lint -- --fix`). */
import { checkNodeVersion } from './node-version.mjs';
import { installPackages } from './packages.mjs';
import { tools } from './paths.mjs';
import { main, run } from './processes.mjs';

await main(
  async () => {
    checkNodeVersion();
    await installPackages();
    const args = process.argv.slice(2);
    return (await run(process.execPath, [tools.eslint, '.', ...args], { show: true })).code;
  },
  { interruptedCode: 130 },
);
