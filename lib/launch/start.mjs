import { checkNode, ensureDebian, ensurePackages, root, registerTypeScript } from './requirements.mjs';

/** `npm start`, and with `--dev` `npm run dev`: installs what is missing, then hands over to serve.ts. */
process.chdir(root);
checkNode();
await ensurePackages({ withTests: false });
// With a database of one's own, the private PostgreSQL is not needed.
if (!process.env.DATABASE_URL) await ensureDebian(['postgresql']);
await registerTypeScript();
const { serve } = await import('./serve');
await serve(process.argv.includes('--dev') ? 'dev' : 'start');
