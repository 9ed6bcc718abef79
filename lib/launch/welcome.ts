import type { Env } from '@/lib/env';

const DEMO_PASSWORD = 'three-docks-afloat';
const DEMO_PEOPLE = ['manager', 'mechanic', 'dock'].map((role) => `${role}@wakewright.example`);

export interface WelcomeOptions {
  env: Pick<Env, 'PUBLIC_URL' | 'SETUP_TOKEN'>;
  embedded: boolean;
  mailboxUrl?: string;
}

/** What a person needs to go on: addresses, and how to sign in or set up. */
export function welcomeLines({ env, embedded, mailboxUrl }: WelcomeOptions): string[] {
  const lines = ['', `Wakewright   ${env.PUBLIC_URL}`];
  if (mailboxUrl) lines.push(`Mailbox      ${mailboxUrl}`);
  if (embedded) {
    lines.push(
      '',
      `Sign in with the password  ${DEMO_PASSWORD}  as`,
      ...DEMO_PEOPLE.map((person) => `  ${person}`),
    );
  } else if (env.SETUP_TOKEN) {
    lines.push('', 'The database is empty: open the address above and set up your operator.');
    lines.push(`Setup token  ${env.SETUP_TOKEN}`);
  }
  return [...lines, '', 'Ctrl-C stops all of it.', ''];
}

export const printWelcome = (options: WelcomeOptions) => console.log(welcomeLines(options).join('\n'));
