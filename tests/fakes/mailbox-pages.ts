export interface Mail {
  id: number;
  receivedAt: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  html: string;
  /** By lower-case name, unfolded; of a repeated header the last one. */
  headers: Record<string, string>;
  raw: string;
}

const ENTITIES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
const escape = (text: string) => text.replace(/[&<>"']/g, (sign) => ENTITIES[sign] ?? sign);

const page = (title: string, body: string) => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escape(title)}</title>
<style>
:root { color-scheme: light dark; font: 1.125rem/1.5 system-ui, sans-serif; }
body { margin: 0 auto; max-width: 60rem; padding: 1rem; }
ul { list-style: none; padding: 0; }
li { border-top: 1px solid; }
li a { display: block; padding: 0.75rem 0; min-height: 2.75rem; }
pre { white-space: pre-wrap; overflow-wrap: anywhere; }
iframe { width: 100%; height: 70vh; border: 1px solid; background: #fff; color-scheme: light; }
</style></head><body>${body}</body></html>`;

export function listPage(mails: readonly Mail[]): string {
  const items = mails.map(
    (mail) =>
      `<li><a href="/messages/${mail.id}"><strong>${escape(mail.subject)}</strong><br>` +
      `to ${escape(mail.to.join(', '))}, ${escape(mail.receivedAt)}</a></li>`,
  );
  const list =
    items.length > 0 ? `<ul>${items.join('')}</ul>` : '<p>No mail yet. Reload when some was sent.</p>';
  return page('Mailbox', `<h1>Mailbox</h1><p>Mail that Wakewright sent; it goes no further.</p>${list}`);
}

export function mailPage(mail: Mail): string {
  const html = mail.html
    ? `<h2>HTML</h2><iframe title="The mail as HTML" src="/messages/${mail.id}/html"></iframe>`
    : '<h2>HTML</h2><p>This mail has no HTML part.</p>';
  return page(
    mail.subject,
    `<p><a href="/">All mail</a> · <a href="/messages/${mail.id}/raw">Source</a></p>
<h1>${escape(mail.subject)}</h1>
<p>From ${escape(mail.from)}<br>To ${escape(mail.to.join(', '))}<br>${escape(mail.receivedAt)}</p>
${html}<h2>Text</h2><pre>${escape(mail.text)}</pre>`,
  );
}
