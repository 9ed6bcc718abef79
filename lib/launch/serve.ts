import { randomBytes } from 'node:crypto';
import path from 'node:path';
import { EnvError, type Env, type LaunchSettings, parseEnv, parseLaunchSettings } from '@/lib/env';
import { startMailbox } from '@/tests/fakes/mailbox';
import { startObjectStore } from '@/tests/fakes/object-store';
import { createCleanup } from './cleanup';
import { isEmpty, migrate, prepareEmbeddedDatabase, startEmbeddedServer } from './embedded';
import { ensureBuild } from './ensure-build';
import { freePort } from './ports';
import { fail, root, step } from './requirements.mjs';
import { claimCheckout, noteProcess, releaseCheckout } from './running';
import { runServices } from './services';
import { keptValue } from './state-folder';
import { printWelcome } from './welcome';

type Mode = 'start' | 'dev';
type Cleanup = ReturnType<typeof createCleanup>;

function settingsOrFail(): LaunchSettings {
  try {
    return parseLaunchSettings(process.env);
  } catch (error) {
    if (error instanceof EnvError) fail(error.message);
    throw error;
  }
}

const makeSecret = () => randomBytes(33).toString('base64url');

interface Database {
  url: string;
  setupToken?: string;
}

async function prepareDatabase(settings: LaunchSettings, cleanup: Cleanup): Promise<Database> {
  if (settings.DATABASE_URL) {
    await migrate(settings.DATABASE_URL);
    const empty = await isEmpty(settings.DATABASE_URL);
    const setupToken = settings.SETUP_TOKEN ?? (empty ? makeSecret() : undefined);
    return { url: settings.DATABASE_URL, setupToken: empty ? setupToken : undefined };
  }
  const server = await startEmbeddedServer(root);
  cleanup.add('PostgreSQL', () => server.stop());
  return { url: await prepareEmbeddedDatabase(server) };
}

async function openMailbox(settings: LaunchSettings, cleanup: Cleanup) {
  if (settings.SMTP_URL) return undefined;
  const mailbox = await startMailbox({
    webPort: await freePort(settings.MAILBOX_PORT),
    smtpPort: await freePort(),
  });
  cleanup.add('mailbox', () => mailbox.stop());
  return mailbox;
}

async function openFiles(settings: LaunchSettings, cleanup: Cleanup): Promise<string> {
  if (settings.S3_URL) return settings.S3_URL;
  const store = await startObjectStore({ directory: path.join(root, '.wakewright/files') });
  cleanup.add('object store', () => store.stop());
  return store.url;
}

async function resolveEnv(
  settings: LaunchSettings,
  database: Database,
  mail: { smtpUrl: string; webUrl?: string },
  filesUrl: string,
): Promise<Env> {
  const port = await freePort(settings.PORT, settings.HOST);
  if (port !== settings.PORT) console.log(`• Port ${settings.PORT} is taken; using ${port}.`);
  return parseEnv({
    ...Object.fromEntries(Object.entries(settings).map(([name, value]) => [name, String(value)])),
    DATABASE_URL: database.url,
    SMTP_URL: mail.smtpUrl,
    S3_URL: filesUrl,
    MAILBOX_URL: settings.MAILBOX_URL ?? mail.webUrl,
    PORT: String(port),
    PUBLIC_URL: settings.PUBLIC_URL ?? `http://127.0.0.1:${port}`,
    AUTH_SECRET: settings.AUTH_SECRET ?? keptValue(root, 'secret', makeSecret),
    SETUP_TOKEN: database.setupToken,
  });
}

async function launch(mode: Mode, settings: LaunchSettings, cleanup: Cleanup): Promise<never> {
  await claimCheckout(root);
  cleanup.add('', () => releaseCheckout(root));
  const database = await prepareDatabase(settings, cleanup);
  if (mode === 'start') {
    await ensureBuild(root, (build) => cleanup.add('build', () => build.stop()));
  }
  const mailbox = await openMailbox(settings, cleanup);
  const env = await resolveEnv(
    settings,
    database,
    mailbox ?? { smtpUrl: settings.SMTP_URL ?? '' },
    await openFiles(settings, cleanup),
  );
  const services = runServices({ root, mode, env, note: (name, pid) => noteProcess(root, name, pid) });
  cleanup.add('web server and worker', () => services.stop());
  await step('Starting the web server and the worker', () => services.ready);
  printWelcome({ env, embedded: !settings.DATABASE_URL, mailboxUrl: mailbox?.webUrl });
  throw new Error(await services.failed);
}

/** What went wrong and, below it, why. */
const messages = (error: unknown): string[] =>
  error instanceof Error ? [error.message, ...messages(error.cause)] : [];

/** Runs Wakewright until Ctrl-C, which ends all of it and exits with 0; exits with 1 when a part of it fails. */
export async function serve(mode: Mode): Promise<void> {
  const settings = settingsOrFail();
  const cleanup = createCleanup();
  let asked = false;
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) {
    process.on(signal, () => {
      if (asked) return;
      asked = true;
      console.log('\n• Stopping …');
      void cleanup.run().then(() => process.exit(0));
    });
  }
  try {
    await launch(mode, settings, cleanup);
  } catch (error) {
    if (asked) return;
    asked = true;
    await cleanup.run();
    fail(messages(error).join('\n'));
  }
}
