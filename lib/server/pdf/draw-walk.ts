import 'server-only';
import { opposite, polarPlace, screenDeg, type Place } from '@/lib/domain/drawing/face-view';
import { spreadApart } from '@/lib/domain/drawing/leader-rows';
import { outerCircle } from '@/lib/domain/drawing/outer-circle';
import { formatLag, formatNumber } from '@/lib/format';
import type { ReportStep, ReportWalk } from '@/lib/schemas/report';
import { drawWords } from './drawn-words';
import type { FigureSize } from './write-figures';

type Doc = PDFKit.PDFDocument;

const WIDTH = 320;
const CENTRE: Place = { x: 160, y: 178 };
const RADIUS = 118;

/** How large the drawing of a vector's way is. */
export function walkSize(): FigureSize {
  return { width: WIDTH, height: 376 };
}

/** The 1x vector of one point in a polar plot, from the first run to the last. */
export function writeWalk(doc: Doc, walk: ReportWalk): void {
  const { title, unit, steps, counts } = walk;
  const outer = outerCircle(Math.max(0, ...steps.map(({ amplitude }) => amplitude)));
  doc.strokeColor('black').fillColor('black').undash();
  drawWords(doc, `${title}, ${unit}`, { x: 0, y: 14, size: 11, bold: true });
  drawGround(doc, outer, walk);
  const places = steps.map((step) =>
    polarPlace(CENTRE, (step.amplitude / outer) * RADIUS, screenDeg(step.lagDeg, opposite(counts))),
  );
  drawWay(doc, places);
  steps.forEach((step, i) => {
    const at = places[i];
    if (at) drawMarker(doc, at, step.purpose);
  });
  drawLabels(doc, steps, places);
  drawKey(doc, walk);
}

function drawGround(doc: Doc, outer: number, { counts, decimalMark }: ReportWalk): void {
  for (let lag = 0; lag < 360; lag += 30) {
    const at = screenDeg(lag, opposite(counts));
    const end = polarPlace(CENTRE, RADIUS, at);
    const word = polarPlace(CENTRE, RADIUS + 14, at);
    doc.moveTo(CENTRE.x, CENTRE.y).lineTo(end.x, end.y).lineWidth(0.3).stroke('#777777');
    drawWords(doc, String(lag), { x: word.x, y: word.y + 4, size: 9.5, anchor: 'middle' });
  }
  for (const share of [1 / 3, 2 / 3, 1]) {
    doc
      .circle(CENTRE.x, CENTRE.y, RADIUS * share)
      .lineWidth(share === 1 ? 0.8 : 0.3)
      .stroke('#777777');
    const words = formatNumber(outer * share, { significant: 2, decimalMark });
    drawWords(doc, words, {
      x: CENTRE.x,
      y: CENTRE.y + RADIUS * share - 3,
      size: 9,
      anchor: 'middle',
    });
  }
}

/** Dashed from run to run; one solid line from the first run to the last. */
function drawWay(doc: Doc, places: readonly Place[]): void {
  const first = places[0];
  const last = places.at(-1);
  if (!first || !last || places.length < 2) return;
  doc.moveTo(first.x, first.y);
  for (const { x, y } of places.slice(1)) doc.lineTo(x, y);
  doc.lineWidth(0.8).dash(3, { space: 2.5 }).stroke('black').undash();
  doc.moveTo(first.x, first.y).lineTo(last.x, last.y).lineWidth(1.8).stroke('black');
}

/** Base hollow circle, trial hollow triangle, check filled square: told apart without colour. */
function drawMarker(doc: Doc, { x, y }: Place, purpose: ReportStep['purpose']): void {
  doc.lineWidth(1.2);
  if (purpose === 'base') doc.circle(x, y, 4).fillAndStroke('white', 'black');
  else if (purpose === 'trial')
    doc.polygon([x, y - 5], [x + 4.6, y + 3.4], [x - 4.6, y + 3.4]).fillAndStroke('white', 'black');
  else doc.rect(x - 3.6, y - 3.6, 7.2, 7.2).fillAndStroke('black', 'black');
}

const MOST_LABELS = 6;
/** Past this distance from the middle a label stands inwards, so that it stays on the drawing. */
const OUTWARDS_TO = 80;

/** The first base run, every trial and every check are named, the repeats of the base are not. */
function drawLabels(doc: Doc, steps: readonly ReportStep[], places: readonly Place[]): void {
  const all = steps.flatMap((step, i) => {
    const at = places[i];
    return at && (i === 0 || step.purpose !== 'base') ? [{ step, at }] : [];
  });
  const worded = all.filter((_, i) => all.length <= MOST_LABELS || i === 0 || i === all.length - 1);
  const heights = spreadApart(
    worded.map(({ at }) => at.y),
    12,
    { min: CENTRE.y - RADIUS, max: CENTRE.y + RADIUS },
  );
  worded.forEach(({ step, at }, i) => {
    const off = at.x - CENTRE.x;
    const toTheLeft = Math.abs(off) > OUTWARDS_TO ? off > 0 : off < 0;
    drawWords(doc, step.label, {
      x: at.x + (toTheLeft ? -9 : 9),
      y: (heights[i] ?? at.y) + 3.5,
      size: 10,
      anchor: toTheLeft ? 'end' : 'start',
      bold: true,
    });
  });
}

function drawKey(doc: Doc, { counts, steps, decimalMark }: ReportWalk): void {
  const way = counts === 'cw' ? 'clockwise' : 'counter-clockwise';
  const [first, last] = [steps[0], steps.at(-1)];
  const said = (step: ReportStep) =>
    `${step.label} ${formatNumber(step.amplitude, { decimalMark })} at ${formatLag(step.lagDeg)}`;
  drawWords(doc, `degrees of lag, counted ${way} from the top`, { x: 0, y: 328, size: 9.5 });
  if (first && last) drawWords(doc, `${said(first)} to ${said(last)}`, { x: 0, y: 342, size: 9.5 });
  const keys = [
    ['base', 'base'],
    ['trial', 'trial'],
    ['check', 'check'],
  ] as const;
  keys.forEach(([purpose, words], i) => {
    const x = 6 + i * 58;
    drawMarker(doc, { x, y: 354 }, purpose);
    drawWords(doc, words, { x: x + 9, y: 357.5, size: 9.5 });
  });
  drawWords(doc, 'solid: first to last run', { x: 180, y: 357.5, size: 9.5 });
}
