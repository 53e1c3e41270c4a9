/*
 * Chart.js plugin: forecasts as boxes in time and level. Moderate is a single outline, severe a double one whose
 * second line is broken where severe is expected occasionally; a superseded version is a thin dotted ghost, a
 * cancelled one is struck by a diagonal. `source()` gives `{from, until, base, top, label, intensity, probability,
 * superseded, cancelled, chosen}`; `faint()` draws outlines only, for the pane whose subject is something else.
 */
import { inside, labelFont, textFont, textWithHalo } from './draw.js';
import { isOccasionallySevere, mainGrade } from '../lib/intensity.js';
import { labelRoom } from './label-room.js';
import { traceSymbol } from './report-symbols.js';

export function forecastBoxes(source, palette, faint = () => false) {
  return {
    id: 'forecastBoxes',
    beforeDatasetsDraw(chart) {
      const { x, y } = chart.scales;
      const colours = palette();
      inside(chart, (ctx, area) => {
        const room = labelRoom();
        const placed = [...source()].sort((a, b) => rank(a) - rank(b) || a.from - b.from).map(box => {
          const left = Math.round(x.getPixelForValue(box.from)) + 0.5;
          const right = Math.round(x.getPixelForValue(box.until)) + 0.5;
          const top = Math.round(y.getPixelForValue(box.top)) + 0.5;
          const bottom = Math.round(y.getPixelForValue(box.base)) + 0.5;
          return { box, left, right, top, bottom };
        }).filter(it => it.right > area.left && it.left < area.right && it.bottom > area.top && it.top < area.bottom);
        for (const { box, left, right, top, bottom } of placed) {
          outline(ctx, box, { left, top, width: right - left, height: bottom - top }, colours, faint());
          if (!box.superseded) room.claim(left, top, right - left, bottom - top);
        }
        // the places go to what is in force first
        if (!faint()) for (const { box, ...at } of placed.sort((a, b) => rank(b.box) - rank(a.box))) words(ctx, box, at, colours, room, area);
      });
    },
  };
}

const rank = box => (box.superseded ? 0 : box.cancelled ? 1 : 2);

function outline(ctx, box, at, colours, faint) {
  const ghost = box.superseded;
  const stroke = (grow, width, dash, halo) => {
    for (const [style, line, pattern] of [[colours.halo, halo, []], [ink(box, colours, faint), width, dash]]) {
      if (!line) continue;
      ctx.setLineDash(pattern);
      ctx.strokeStyle = style;
      ctx.lineWidth = line;
      ctx.strokeRect(at.left - grow, at.top - grow, at.width + 2 * grow, at.height + 2 * grow);
    }
  };
  if (faint) {
    stroke(0, 1, [7, 4], 2);
  } else if (ghost) {
    stroke(0, 1, [1.5, 3], 0);
  } else {
    stroke(0, 1.5, [], 3.5);
    if (severe(box)) stroke(3.5, 1.5, [], 0);
    else if (isOccasionallySevere(box.intensity)) stroke(3.5, 1.25, [6, 5], 0);
    if (box.chosen) stroke(7, 1, [4, 2], 0);
  }
  ctx.setLineDash([]);
  if (box.cancelled && !faint) {
    ctx.beginPath();
    ctx.moveTo(at.left, at.top + at.height);
    ctx.lineTo(at.left + at.width, at.top);
    ctx.stroke();
  }
}

const severe = box => box.intensity === 'SEV' || box.intensity === 'EXTRM';
const ink = (box, colours, faint) => (faint || box.superseded || box.cancelled ? colours.second : colours.mark);

const LINE = 18;
const GAP = 10;

/** Number, version, symbol and probability: in the box's upper edge where they fit, otherwise close above or below. */
function words(ctx, box, at, colours, room, area) {
  if (box.superseded) return;
  const label = box.cancelled ? `${box.label} cancelled` : box.label;
  ctx.font = textFont(colours, 12, 600);
  const labelWidth = ctx.measureText(label).width;
  ctx.font = labelFont(colours);
  const probabilityWidth = ctx.measureText(box.probability).width;
  const pad = 6;
  const needed = labelWidth + GAP + 14 + GAP + probabilityWidth;
  const fits = needed + 2 * pad <= at.right - at.left && at.bottom - at.top >= LINE + 4;
  const left = fits ? at.left + pad : Math.max(area.left, Math.min(at.left, area.right - needed));
  const edge = severe(box) ? 6 : 3;
  const above = at.top - LINE - edge;
  const below = at.bottom + edge;
  const places = [0, 1, 2, 3].flatMap(lane => [above - lane * LINE, below + lane * LINE])
    .filter(it => it >= area.top && it + LINE <= area.bottom);
  const top = fits ? at.top + 3 : room.take(left, places, needed + pad, LINE) ?? above;
  const line = top + LINE / 2;
  ctx.strokeStyle = ctx.fillStyle = ink(box, colours, false);
  if (!fits && top !== above && top !== below) {
    // a label that had to go further is led back to its box
    ctx.lineWidth = 1;
    ctx.beginPath();
    ctx.moveTo(at.left + 0.5, top < at.top ? at.top : at.bottom);
    ctx.lineTo(at.left + 0.5, top < at.top ? top + LINE : top);
    ctx.stroke();
  }
  ctx.textBaseline = 'middle';
  ctx.textAlign = 'left';
  ctx.font = textFont(colours, 12, 600);
  textWithHalo(ctx, label, left, line, ink(box, colours, false), colours.panel);
  ctx.save();
  ctx.translate(left + labelWidth + GAP + 5, line);
  ctx.strokeStyle = ink(box, colours, false);
  ctx.lineWidth = 1.75;
  ctx.lineJoin = 'round';
  traceSymbol(ctx, mainGrade(box.intensity), 0.75);
  ctx.restore();
  ctx.font = labelFont(colours);
  const end = fits ? at.right - pad : left + needed;
  ctx.textAlign = 'right';
  textWithHalo(ctx, box.probability, end, line, ink(box, colours, false), colours.panel);
}
