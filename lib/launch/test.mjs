import { checkNode, ensureDebian, ensurePackages, registerTypeScript, root } from './requirements.mjs';

/** `npm test`: installs what is missing, then hands over to run-tests.ts. */
process.chdir(root);
checkNode();
await ensurePackages({ withTests: true });
await ensureDebian(['postgresql', 'chromium', 'python3-dateutil']);
await registerTypeScript();
const { runTests } = await import('./run-tests');
await runTests();
