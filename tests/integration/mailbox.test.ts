import { createTransport } from 'nodemailer';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import { type Mailbox, startMailbox } from '../fakes/mailbox';

let mailbox: Mailbox;
beforeAll(async () => {
  mailbox = await startMailbox();
});
afterAll(() => mailbox.stop());
beforeEach(() => mailbox.clear());

const send = (subject: string) =>
  createTransport(mailbox.smtpUrl).sendMail({
    from: 'Wakewright <wakewright@localhost>',
    to: 'manager@wakewright.example',
    subject,
    text: 'Überfällig: zwei',
    html: '<p>Überfällig: <b>zwei</b></p><script>alert(1)</script>',
    headers: { 'List-Unsubscribe': '<http://127.0.0.1/u/1>' },
  });

const page = async (path: string) => (await fetch(mailbox.webUrl + path)).text();

test('a mail that was sent is in the list, the newest first, with what a test asks about', async () => {
  await send('first');
  await send('second');
  const listed = await (await fetch(`${mailbox.webUrl}/messages.json`)).json();
  expect(listed).toMatchObject([
    {
      subject: 'second',
      to: ['manager@wakewright.example'],
      text: 'Überfällig: zwei',
      headers: { 'list-unsubscribe': '<http://127.0.0.1/u/1>' },
    },
    { subject: 'first' },
  ]);
});

test('a person can open it as text, as HTML and as its source', async () => {
  await send('<i>overdue</i>');
  expect(await page('/')).toContain('&lt;i&gt;overdue&lt;/i&gt;');
  const { id } = mailbox.messages()[0] ?? { id: 0 };
  expect(await page(`/messages/${id}`)).toContain('Überfällig: zwei');
  expect(await page(`/messages/${id}/raw`)).toContain('List-Unsubscribe:');
  const html = await fetch(`${mailbox.webUrl}/messages/${id}/html`);
  expect(await html.text()).toContain('<b>zwei</b>');
  expect(html.headers.get('content-security-policy')).toMatch(
    /^sandbox(?!.*allow-scripts).*default-src 'none'/,
  );
});

test('the box can be emptied', async () => {
  await send('first');
  await fetch(`${mailbox.webUrl}/messages.json`, { method: 'DELETE' });
  expect(mailbox.messages()).toEqual([]);
  expect(await page('/')).toContain('No mail yet');
});
