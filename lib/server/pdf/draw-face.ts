import 'server-only';
import { curvedArrow } from '@/lib/domain/drawing/curved-arrow';
import { opposite, polarPlace, screenDeg, senseSeenFrom } from '@/lib/domain/drawing/face-view';
import type { Place, Sense } from '@/lib/domain/drawing/face-view';
import { leaderRows, type LeaderRow } from '@/lib/domain/drawing/leader-rows';
import { weightDotRadii } from '@/lib/domain/drawing/weight-dots';
import { END_WORDS, formatDegrees, formatMass } from '@/lib/format';
import type { ReportFace, ReportWeight } from '@/lib/schemas/report';
import { drawWords } from './drawn-words';
import type { FigureSize } from './write-figures';

type Doc = PDFKit.PDFDocument;

/** Measures of the drawing in its own units, the same proportions as on the screen. */
const WIDTH = 320;
const CENTRE: Place = { x: 160, y: 190 };
const RIM = 90;
const FIRST_ROW = 334;
const ROW_HEIGHT = 33;
const FROM_EDGE = 28;

/** How large the drawing of a plane is. */
export function faceSize({ plane, weights }: ReportFace): FigureSize {
  const rows = rowsOf(weights, seenOf(plane)).reduce((most, { row }) => Math.max(most, row + 1), 0);
  return { width: WIDTH, height: FIRST_ROW + Math.max(0.6, rows) * ROW_HEIGHT };
}

function seenOf(plane: ReportFace['plane']): Sense {
  return senseSeenFrom(plane.rotationFromDriveEnd, 'drive-end');
}

function rowsOf(weights: readonly ReportWeight[], seen: Sense): LeaderRow[] {
  return leaderRows(weights.map(({ angleDeg }) => screenDeg(angleDeg, seen)));
}

/** One plane seen from the drive end: mark, sense of rotation, way of counting, and every weight. */
export function writeFace(doc: Doc, { plane, weights }: ReportFace): void {
  const seen = seenOf(plane);
  doc.strokeColor('black').fillColor('black').lineWidth(1).undash();
  drawWords(doc, plane.name, { x: CENTRE.x, y: 15, size: 14, anchor: 'middle', bold: true });
  drawWords(doc, END_WORDS['drive-end'], { x: CENTRE.x, y: 33, size: 12, anchor: 'middle' });
  drawDisc(doc, seen);
  drawArrows(doc, seen);
  drawMark(doc);
  for (const { label, angleDeg } of plane.positions ?? [])
    drawHole(doc, label, screenDeg(angleDeg, seen));
  drawWeights(doc, { plane, weights }, seen);
  if (weights.length === 0)
    drawWords(doc, 'no weight in this plane', {
      x: CENTRE.x,
      y: FIRST_ROW,
      size: 11,
      anchor: 'middle',
    });
}

function drawDisc(doc: Doc, seen: Sense): void {
  doc.circle(CENTRE.x, CENTRE.y, RIM).lineWidth(1.4).stroke();
  doc
    .circle(CENTRE.x, CENTRE.y, RIM / 2)
    .lineWidth(0.4)
    .stroke();
  for (let deg = 0; deg < 360; deg += 10) {
    const at = screenDeg(deg, seen);
    const inner = polarPlace(CENTRE, RIM * (deg % 30 === 0 ? 0.88 : 0.94), at);
    const outer = polarPlace(CENTRE, RIM, at);
    doc.moveTo(inner.x, inner.y).lineTo(outer.x, outer.y).lineWidth(0.6).stroke();
    const word = polarPlace(CENTRE, RIM * 0.76, at);
    if (deg % 30 === 0 && deg > 0)
      drawWords(doc, String(deg), { x: word.x, y: word.y + 4, size: 10, anchor: 'middle' });
  }
}

const ARROW = { centre: CENTRE, radius: 126 };
const TURN_WORDS = { cw: 'clockwise', ccw: 'counter-clockwise' } as const;

/** A thick arrow of rotation, a dotted one for the way degrees count; both in words. */
function drawArrows(doc: Doc, seen: Sense): void {
  const turns = curvedArrow(
    ARROW,
    { sense: seen, startDeg: 28, lengthDeg: 84 },
    { length: 18, width: 17 },
  );
  const counts = curvedArrow(
    ARROW,
    { sense: opposite(seen), startDeg: 28, lengthDeg: 56 },
    { length: 12, width: 10 },
  );
  doc.path(turns.shaft).lineWidth(4.5).stroke();
  fillHead(doc, turns.head);
  doc.path(counts.shaft).lineWidth(1.5).dash(1.5, { space: 3 }).stroke().undash();
  fillHead(doc, counts.head);
  const right = { x: WIDTH - 2, anchor: 'end' } as const;
  const left = { x: 2, anchor: 'start' } as const;
  const [turnSide, countSide] = seen === 'cw' ? [right, left] : [left, right];
  drawWords(doc, 'rotor turns', { ...turnSide, y: 58, size: 11, bold: true });
  drawWords(doc, TURN_WORDS[seen], { ...turnSide, y: 72, size: 11, bold: true });
  drawWords(doc, 'count degrees', { ...countSide, y: 58, size: 11 });
  drawWords(doc, 'this way', { ...countSide, y: 72, size: 11 });
}

function fillHead(doc: Doc, corners: string): void {
  const numbers = corners.split(' ').map(Number);
  const points = [0, 2, 4].map((i): [number, number] => [numbers[i] ?? 0, numbers[i + 1] ?? 0]);
  doc.polygon(...points).fill('black');
}

function drawMark(doc: Doc): void {
  const { x, y } = CENTRE;
  const tip = y - RIM - 2;
  doc.polygon([x - 8, tip - 15], [x + 8, tip - 15], [x, tip]).fill('black');
  drawWords(doc, 'mark · 0°', { x, y: tip - 19, size: 11, anchor: 'middle', bold: true });
}

function drawHole(doc: Doc, label: string, deg: number): void {
  const hole = polarPlace(CENTRE, RIM, deg);
  const word = polarPlace(CENTRE, RIM - 14, deg);
  doc.circle(hole.x, hole.y, 3.5).lineWidth(0.8).fillAndStroke('white', 'black');
  drawWords(doc, label, { x: word.x, y: word.y + 4, size: 9, anchor: 'middle', bold: true });
}

function drawWeights(doc: Doc, { plane, weights }: ReportFace, seen: Sense): void {
  const rows = rowsOf(weights, seen);
  const radii = weightDotRadii(
    weights.map(({ massG }) => massG),
    10,
  );
  weights.forEach((weight, i) => {
    const at = polarPlace(CENTRE, RIM, screenDeg(weight.angleDeg, seen));
    const row = rows[i] ?? { side: 'left', row: 0, channel: 0 };
    drawLeader(doc, at, row);
    drawDot(doc, { at, radius: radii[i] ?? 10 }, weight.state);
    drawWeightWords(doc, row, [
      `${formatMass(weight.massG, plane.decimalMark)} at ${formatDegrees(weight.angleDeg)}`,
      `${STATE_WORDS[weight.state]}, ${weight.label}`,
    ]);
  });
}

const STATE_WORDS = { on: 'on the rotor', trial: 'trial weight', removed: 'taken off' } as const;

function drawLeader(doc: Doc, at: Place, { side, row, channel }: LeaderRow): void {
  const edge = Math.max(2, 24 - channel * 6);
  const mirrored = (x: number) => (side === 'left' ? x : WIDTH - x);
  const y = FIRST_ROW + row * ROW_HEIGHT - 5;
  doc.moveTo(at.x, at.y).lineTo(mirrored(edge), at.y).lineTo(mirrored(edge), y);
  doc.lineTo(mirrored(FROM_EDGE), y).lineWidth(0.7).stroke('black');
}

function drawDot(
  doc: Doc,
  { at, radius }: { at: Place; radius: number },
  state: ReportWeight['state'],
): void {
  doc.lineWidth(1.2).circle(at.x, at.y, radius);
  if (state === 'removed') {
    doc.dash(2, { space: 2 }).fillAndStroke('white', 'black').undash();
    return;
  }
  doc.fillAndStroke('#9a9a9a', 'black');
  if (state === 'trial') doc.circle(at.x, at.y, radius / 2).stroke('black');
}

function drawWeightWords(doc: Doc, { side, row }: LeaderRow, lines: [string, string]): void {
  const x = side === 'left' ? FROM_EDGE + 3 : WIDTH - FROM_EDGE - 3;
  const anchor = side === 'left' ? 'start' : 'end';
  const y = FIRST_ROW + row * ROW_HEIGHT;
  drawWords(doc, lines[0], { x, y, size: 11, anchor, bold: true });
  drawWords(doc, lines[1], { x, y: y + 13, size: 9.5, anchor });
}
