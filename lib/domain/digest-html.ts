import type { Digest, DockDigest } from './digest';
import {
  capital,
  describeTotals,
  type DigestLinks,
  digestSections,
  digestSubject,
  type LetterSection,
} from './digest-letter';
import { escapeHtml } from './escape-html';
import { describeDay } from './words';

const FONT = "font-family:'Atkinson Hyperlegible Next',Verdana,Arial,sans-serif";
const COLOURS = {
  paper: '#fbf9f2',
  raised: '#ffffff',
  ink: '#0a1e28',
  soft: '#2f444c',
  line: '#004c70',
  edge: '#c3cecd',
};

/** Mail programs that can show dark letters take these instead; the rest invert, or show the light ones. */
const DARK = `@media (prefers-color-scheme: dark) {
.paper { background: #07151c !important; } .raised { background: #0d222c !important; border-color: #2a4652 !important; }
.ink, .ink a { color: #eef5f3 !important; } .soft { color: #bdcfd1 !important; }
.line { border-color: #66c9ee !important; } .link { color: #92daf4 !important; }
}`;

/** The letter as HTML: inline styles and tables for mail programs, no picture, nothing fetched. */
export function digestHtml(digest: Digest, links: DigestLinks): string {
  return `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<meta name="color-scheme" content="light dark"><meta name="supported-color-schemes" content="light dark">
<title>${escapeHtml(digestSubject(digest))}</title><style>${DARK}</style></head>
<body class="paper" style="margin:0;padding:0;background:${COLOURS.paper}">
<table role="presentation" class="paper" width="100%" cellpadding="0" cellspacing="0" style="background:${COLOURS.paper}"><tr><td align="center" style="padding:16px 8px">
<table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="max-width:640px"><tr>
<td class="ink" style="${FONT};font-size:16px;line-height:24px;color:${COLOURS.ink};text-align:left">
<p class="soft" style="margin:0;color:${COLOURS.soft}">Wakewright</p>
<h1 style="margin:0 0 4px;font-size:24px;line-height:30px">Week of ${escapeHtml(describeDay(digest.weekOn))}</h1>
<p style="margin:0 0 16px;font-size:18px;line-height:26px">${escapeHtml(capital(describeTotals(digest)))}.</p>
${digest.docks.map((dock) => dockHtml(digest, dock, links)).join('\n')}
<p style="margin:16px 0 8px">${anchor(links.page('/digest'), 'All of it as it stands now')}</p>
<p class="soft" style="margin:0;font-size:14px;line-height:20px;color:${COLOURS.soft}">You get this letter on Mondays because you asked for it. ${anchor(links.unsubscribe, 'Send me no more of them')}</p>
</td></tr></table></td></tr></table></body></html>
`;
}

function dockHtml(digest: Digest, dock: DockDigest, links: DigestLinks): string {
  return `<table role="presentation" width="100%" cellpadding="0" cellspacing="0" style="margin:0 0 16px"><tr>
<td class="raised ink" style="${FONT};font-size:16px;line-height:24px;color:${COLOURS.ink};background:${COLOURS.raised};border:1px solid ${COLOURS.edge};padding:16px">
<h2 class="line" style="margin:0 0 8px;padding:0 0 6px;font-size:20px;line-height:26px;border-bottom:3px solid ${COLOURS.line}">${escapeHtml(dock.name)}</h2>
${digestSections(digest, dock)
  .map((section) => sectionHtml(section, links))
  .join('\n')}
</td></tr></table>`;
}

function sectionHtml({ title, note, lines, none }: LetterSection, links: DigestLinks): string {
  const items = lines.map(
    ({ unit, path, text }) =>
      `<li style="margin:0 0 6px"><strong>${anchor(links.page(path), unit)}</strong> ${escapeHtml(text)}</li>`,
  );
  return `<h3 style="margin:16px 0 4px;font-size:17px;line-height:24px">${escapeHtml(title)}${lines.length > 0 ? ` (${lines.length})` : ''}</h3>
${note ? `<p class="soft" style="margin:0 0 6px;color:${COLOURS.soft}">${escapeHtml(note)}</p>` : ''}
${items.length > 0 ? `<ul style="margin:0;padding:0 0 0 20px">${items.join('')}</ul>` : `<p style="margin:0">${escapeHtml(none)}</p>`}`;
}

function anchor(href: string, text: string): string {
  return `<a class="link" href="${escapeHtml(href)}" style="color:#00405f">${escapeHtml(text)}</a>`;
}
