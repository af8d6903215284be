/**
 * A certificate as PDF: one page, the piece drawn in lines, words that a program can read in their order, every font in
 * it. The same facts give the same bytes.
 */
import PDFDocument from 'pdfkit';
import svgToPdf from 'svg-to-pdfkit';
import type { ClothPiece } from '#core/craft/cloth/cloth-piece.ts';
import { drawCloth } from '#core/craft/cloth/draw-cloth.ts';
import { fontFiles, fontName, runsOf, type Run, type Weight } from './lettering.ts';

export interface CertificateFacts {
  /** As she wishes; empty, or in letters we have no type for, leaves a line to write it by hand. */
  readonly name: string;
  readonly series: string;
  /** What it is, behind the name of the series; may be empty. */
  readonly seriesRest: string;
  readonly teacher: string;
  readonly workroom: string;
  /** `1 December 2026` */
  readonly day: string;
  /** The moment that stands in the file, so that it is not the one it was made at. */
  readonly at: Date;
  /** `14 h`; empty leaves it away. */
  readonly hours: string;
  readonly size: string;
  /** Drawn; null where nothing can be. */
  readonly cloth: ClothPiece | null;
  readonly clothWords: string;
  readonly paper: 'A4' | 'LETTER';
}

const INK = '#101c2d';
const QUIET = '#4a5564';
const MARGIN = 56;
const PIECE = { width: 310, height: 385 } as const;
const BASE = fontName('latin', 'plain');

type Doc = PDFKit.PDFDocument;

/** @returns the bytes of the file. */
export async function drawCertificate(facts: CertificateFacts): Promise<Uint8Array> {
  const base = fontFiles().find(({ name }) => name === BASE);
  const doc = new PDFDocument({
    size: facts.paper, margin: MARGIN, pdfVersion: '1.7', tagged: true, displayTitle: true, lang: 'en-GB', font: base?.data as unknown as string,
    info: { Title: `${facts.series}, certificate`, Author: facts.workroom, Subject: 'A finished piece', CreationDate: facts.at, Producer: 'Fellmark', Creator: 'Fellmark' },
  });
  const bytes = collect(doc);
  for (const { name, data } of fontFiles()) doc.registerFont(name, data);
  const root = doc.struct('Document');
  doc.addStructure(root);
  let y = MARGIN;
  const say = (tag: 'H1' | 'P', words: string, size: number, weight: Weight = 'plain', colour = INK): void => {
    const lines = linesOf(doc, words, size, weight);
    root.add(doc.struct(tag, { actual: lines.map(({ runs }) => runs.map(({ text }) => text).join('')).join(' ') }, () => { y = setLines(doc, lines, { y, colour }); }));
  };
  if (facts.cloth !== null) {
    const svg = drawCloth(facts.cloth, { id: 'piece', as: 'hanging', width: 380, decorative: true });
    root.add(doc.struct('Figure', { alt: facts.clothWords }, () => {
      svgToPdf(doc, svg, (doc.page.width - PIECE.width) / 2, y, { ...PIECE, preserveAspectRatio: 'xMidYMid meet', assumePt: true });
    }));
  }
  y += PIECE.height + 34;
  sayName(facts.name, doc, say, () => { y += 44; ruleToWriteOn(doc, y); y += 14; });
  y += 12;
  say('P', `has made ${facts.series}`, 19);
  if (facts.seriesRest !== '') say('P', `${facts.seriesRest.charAt(0).toLowerCase()}${facts.seriesRest.slice(1)}`, 13, 'plain', QUIET);
  y += 12;
  say('P', [facts.size, facts.hours === '' ? '' : `${facts.hours} of work`].filter((words) => words !== '').join(', '), 13);
  say('P', `with ${facts.teacher}, ${facts.workroom}`, 13);
  say('P', facts.day, 13);
  y = doc.page.height - MARGIN - 26;
  say('P', 'Every part of the series is done. This is a keepsake, no professional qualification. Fellmark', 8.5, 'plain', QUIET);
  root.end();
  doc.end();
  return bytes;
}

function collect(doc: Doc): Promise<Uint8Array> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => { resolve(Buffer.concat(chunks)); });
    doc.on('error', reject);
  });
}

/** The largest letters in which it takes one line, else small ones on several. */
function sayName(name: string, doc: Doc, say: (tag: 'H1', words: string, size: number, weight: Weight) => void, byHand: () => void): void {
  const runs = runsOf(name, 'strong');
  if (runs === null || runs.length === 0) {
    byHand();
    return;
  }
  const size = [36, 30, 24, 19].find((one) => widthOf(doc, runs, one) <= doc.page.width - 2 * MARGIN) ?? 15;
  say('H1', name, size, 'strong');
}

function ruleToWriteOn(doc: Doc, y: number): void {
  doc.markContent('Artifact', { type: 'Layout' });
  doc.moveTo(MARGIN + 60, y).lineTo(doc.page.width - MARGIN - 60, y).lineWidth(0.7).stroke(QUIET);
  doc.endMarkedContent();
}

const widthOf = (doc: Doc, runs: readonly Run[], size: number): number => runs.reduce((sum, { font, text }) => sum + doc.font(font).fontSize(size).widthOfString(text), 0);

interface Line { readonly runs: readonly Run[]; readonly width: number; readonly size: number }

const MOST_LINES = 4;

/** Broken at blanks, and inside a word that is wider than the page; what is longer than `MOST_LINES` ends in dots. */
function linesOf(doc: Doc, words: string, size: number, weight: Weight): Line[] {
  const most = doc.page.width - 2 * MARGIN;
  const lineOf = (text: string): Line => {
    const runs = runsOf(text, weight) ?? runsOf(text.replace(/[^\u0020-\u00ff]/g, ''), weight) ?? [];
    return { runs, size, width: widthOf(doc, runs, size) };
  };
  const texts: string[] = [];
  for (const word of words.split(/\s+/).flatMap((one) => one.match(/.{1,40}/gu) ?? [])) {
    const last = texts.at(-1);
    if (last !== undefined && lineOf(`${last} ${word}`).width <= most) texts[texts.length - 1] = `${last} ${word}`;
    else texts.push(word);
  }
  const shown = texts.length > MOST_LINES ? [...texts.slice(0, MOST_LINES - 1), `${texts[MOST_LINES - 1] ?? ''}…`] : texts;
  return shown.map(lineOf);
}

/** Centred; returns where the next line may begin. */
function setLines(doc: Doc, lines: readonly Line[], { y, colour }: { readonly y: number; readonly colour: string }): number {
  let at = y;
  for (const { runs, width, size } of lines) {
    let x = (doc.page.width - width) / 2;
    for (const { font, text } of runs) {
      doc.font(font).fontSize(size).fillColor(colour).text(text, x, at, { lineBreak: false });
      x += doc.widthOfString(text);
    }
    at += size * 1.35;
  }
  return at;
}
