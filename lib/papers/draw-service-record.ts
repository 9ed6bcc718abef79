import path from 'node:path';
import PDFDocument from 'pdfkit';
import type { ServiceRecord } from '@/lib/domain/service-record';

const FONTS = path.join(process.cwd(), 'node_modules/@fontsource/atkinson-hyperlegible-next/files');
const MARGIN = 48;
const TERM_WIDTH = 120;
const INK = '#0a1e28';
const SOFT = '#2f444c';
const LINE = '#004c70';
const ALARM = '#861313';

/** Signs that the shipped typeface does not have, written out. */
const SPELT: Record<string, string> = {
  Ω: 'ohm',
  '⅛': '1/8',
  '⅜': '3/8',
  '⅝': '5/8',
  '⅞': '7/8',
  '⅓': '1/3',
  '⅔': '2/3',
};
const spell = (text: string) => text.replace(/[Ω⅛⅜⅝⅞⅓⅔]/gu, (sign) => SPELT[sign] ?? sign);

/** Draws a service record as a PDF (A4), with its fonts in it and its text as text. */
export async function drawServiceRecord(record: ServiceRecord): Promise<Buffer> {
  const paper = new PDFDocument({
    size: 'A4',
    margins: { top: MARGIN, left: MARGIN, right: MARGIN, bottom: MARGIN + 24 },
    bufferPages: true,
    lang: 'en',
    displayTitle: true,
    info: { Title: record.title, Creator: 'Wakewright' },
  });
  paper.registerFont('text', path.join(FONTS, 'atkinson-hyperlegible-next-latin-400-normal.woff'));
  paper.registerFont('strong', path.join(FONTS, 'atkinson-hyperlegible-next-latin-700-normal.woff'));
  const chunks: Buffer[] = [];
  const done = new Promise<Buffer>((resolve, reject) => {
    paper.on('data', (chunk: Buffer) => chunks.push(chunk));
    paper.on('end', () => resolve(Buffer.concat(chunks)));
    paper.on('error', reject);
  });
  drawHead(paper, record);
  drawSteps(paper, record);
  drawList(paper, 'Parts', record.parts);
  drawList(paper, 'Signatures', record.signatures);
  drawFooters(paper, record.footer);
  paper.end();
  return done;
}

type Paper = InstanceType<typeof PDFDocument>;

function drawHead(paper: Paper, { title, warning, facts }: ServiceRecord): void {
  paper.font('strong').fontSize(18).fillColor(INK).text(spell(title));
  paper.moveDown(0.3);
  drawRule(paper, LINE, 2);
  if (warning) paper.moveDown(0.5).font('strong').fontSize(12).fillColor(ALARM).text(spell(warning));
  paper.moveDown(0.6);
  for (const { term, text } of facts) {
    const top = paper.y;
    paper.font('text').fontSize(10).fillColor(SOFT).text(term, MARGIN, top, { width: TERM_WIDTH });
    const after = paper.y;
    paper.fillColor(INK).text(spell(text), MARGIN + TERM_WIDTH, top);
    paper.x = MARGIN;
    paper.y = Math.max(after, paper.y) + 3;
  }
}

function drawSteps(paper: Paper, { steps }: ServiceRecord): void {
  if (steps.length === 0) return;
  drawHeading(paper, 'Found and left');
  for (const { title, results } of steps) {
    keepTogether(paper, 40);
    paper.font('strong').fontSize(10).fillColor(INK).text(spell(title), MARGIN);
    for (const { where, text, verdict, by } of results) {
      keepTogether(paper, 28);
      const said = [where && `${where}:`, text, verdict && `– ${verdict}`].filter(Boolean).join(' ');
      const wrong = verdict !== null && /^[A-Z]/.test(verdict);
      paper
        .font(wrong ? 'strong' : 'text')
        .fontSize(10)
        .fillColor(wrong ? ALARM : INK)
        .text(spell(said), MARGIN + 12);
      paper
        .font('text')
        .fontSize(8)
        .fillColor(SOFT)
        .text(spell(by), MARGIN + 12);
    }
    paper.x = MARGIN;
    paper.moveDown(0.5);
  }
}

function drawList(paper: Paper, heading: string, lines: readonly string[]): void {
  if (lines.length === 0) return;
  drawHeading(paper, heading);
  for (const line of lines) {
    keepTogether(paper, 16);
    paper.font('text').fontSize(10).fillColor(INK).text(spell(line), MARGIN);
    paper.moveDown(0.2);
  }
}

function drawHeading(paper: Paper, text: string): void {
  keepTogether(paper, 60);
  paper.moveDown(0.8);
  drawRule(paper, SOFT, 0.5);
  paper.moveDown(0.4).font('strong').fontSize(13).fillColor(INK).text(text, MARGIN);
  paper.moveDown(0.3);
}

function drawRule(paper: Paper, colour: string, width: number): void {
  paper
    .moveTo(MARGIN, paper.y)
    .lineTo(paper.page.width - MARGIN, paper.y)
    .lineWidth(width)
    .strokeColor(colour)
    .stroke();
}

/** Begins a new page unless so many points are left on this one. */
function keepTogether(paper: Paper, points: number): void {
  if (paper.y + points > paper.page.height - paper.page.margins.bottom) paper.addPage();
}

/** The caution and the page numbers stand below the margin, where text does not flow. */
function drawFooters(paper: Paper, footer: string): void {
  const { start, count } = paper.bufferedPageRange();
  for (let index = start; index < start + count; index += 1) {
    paper.switchToPage(index);
    const { bottom } = paper.page.margins;
    paper.page.margins.bottom = 0;
    const width = paper.page.width - 2 * MARGIN;
    paper
      .font('text')
      .fontSize(8)
      .fillColor(SOFT)
      .text(spell(footer), MARGIN, paper.page.height - MARGIN - 12, { width: width - 70 });
    paper.text(`Page ${index + 1} of ${count}`, MARGIN, paper.page.height - MARGIN - 12, {
      width,
      align: 'right',
    });
    paper.page.margins.bottom = bottom;
  }
}
