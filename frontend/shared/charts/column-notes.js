/*
 * Chart.js plugin: what must be said about a column in words, on the column itself: the outline with its balloon's
 * path, "carried from 1200Z", "not analysed: …". `source()` gives `{left, right, path, carriedFrom, carriedUntil,
 * carried, problem}` with outlines as lists of `{minute, level}`.
 */
import { inside, labelFont, textWithHalo } from './draw.js';

export function columnNotes(source, palette) {
  return {
    id: 'columnNotes',
    beforeDatasetsDraw(chart) {
      const { x, y } = chart.scales;
      const colours = palette();
      inside(chart, (ctx, area) => {
        const trace = points => {
          ctx.beginPath();
          points.forEach((point, index) => {
            const at = [x.getPixelForValue(point.minute), y.getPixelForValue(point.level)];
            if (index) ctx.lineTo(...at); else ctx.moveTo(...at);
          });
        };
        for (const note of source()) {
          ctx.lineWidth = 1;
          ctx.strokeStyle = colours.line;
          ctx.setLineDash(note.problem ? [2, 3] : []);
          for (const side of [note.left, note.right]) { trace(side); ctx.stroke(); }
          ctx.setLineDash([1, 4]);
          ctx.strokeStyle = colours.halo;
          trace(note.path);
          ctx.stroke();
          ctx.setLineDash([]);
        }
        ctx.font = labelFont(colours);
        ctx.textBaseline = 'alphabetic';
        for (const note of source()) {
          const start = Math.max(area.left, x.getPixelForValue(note.carriedFrom));
          const end = Math.min(area.right, x.getPixelForValue(note.carriedUntil));
          if (note.carried && end - start > ctx.measureText(note.carried).width + 8) {
            ctx.textAlign = 'left';
            textWithHalo(ctx, note.carried, start + 4, area.bottom - 6, colours.text, colours.panel);
          }
          const right = x.getPixelForValue(note.right[note.right.length - 1].minute);
          if (note.problem && right > area.left && x.getPixelForValue(note.left[0].minute) < area.right) {
            const left = Math.max(area.left + 4, x.getPixelForValue(note.path[0].minute));
            ctx.textAlign = 'left';
            textWithHalo(ctx, note.problem, left, area.bottom - 22, colours.text, colours.panel);
          }
        }
      });
    },
  };
}
