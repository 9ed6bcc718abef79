import { escapeHtml } from '@/lib/domain/escape-html';
import type { Letter } from './queue-mail';

const DAY_AND_TIME = new Intl.DateTimeFormat('en-GB', {
  dateStyle: 'full',
  timeStyle: 'short',
  timeZone: 'UTC',
});

/** An instant as a letter says it: "Tuesday 8 December 2026 at 04:13 UTC". */
export function instantInWords(at: Date): string {
  return `${DAY_AND_TIME.format(at).replace(',', '')} UTC`;
}

/** What a letter that asks for one thing says, from top to bottom. */
export type LetterParts = {
  kind: Letter['kind'];
  to: string;
  subject: string;
  before: string[];
  link?: { label: string; href: string };
  after: string[];
};

/** A letter of plain paragraphs around one link, as text and as HTML that says the same. */
export function writeLetter({ kind, to, subject, before, link, after }: LetterParts): Letter {
  const text = [...before, ...(link ? [`${link.label}:\n${link.href}`] : []), ...after, 'Wakewright'];
  const html = [
    ...before.map(paragraph),
    ...(link
      ? [`<p><a href="${escapeHtml(link.href)}"><strong>${escapeHtml(link.label)}</strong></a></p>`]
      : []),
    ...after.map(paragraph),
    paragraph('Wakewright'),
  ];
  return {
    kind,
    to,
    subject: subject.replace(/\s+/g, ' '),
    text: `${text.join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><meta charset="utf-8"><title>${escapeHtml(subject)}</title><body>${html.join('')}</body></html>`,
  };
}

const paragraph = (words: string) => `<p>${escapeHtml(words)}</p>`;
