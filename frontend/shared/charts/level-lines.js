/*
 * Chart.js plugin: the lines Ri = 0.25 (thick, continuous) and Ri = 1 (thin, dashed). `source()` gives segments
 * `{flightLevel, from, until, carriedUntil, critical}`; the carried part is drawn lighter, it was not observed.
 */
import { inside, strokeWithHalo } from './draw.js';

export function levelLines(source, palette) {
  return {
    id: 'levelLines',
    beforeDatasetsDraw(chart) {
      const { x, y } = chart.scales;
      const colours = palette();
      inside(chart, ctx => {
        for (const segment of source()) {
          const height = y.getPixelForValue(segment.flightLevel);
          const start = x.getPixelForValue(segment.from);
          const middle = x.getPixelForValue(segment.until);
          const end = x.getPixelForValue(segment.carriedUntil);
          const line = (from, until, alpha) => {
            if (!(until > from)) return;
            ctx.globalAlpha = alpha;
            ctx.beginPath();
            ctx.moveTo(from, height);
            ctx.lineTo(until, height);
            if (segment.critical) {
              strokeWithHalo(ctx, colours.text, colours.halo, 2.5);
            } else {
              // between the two bands it parts a plain line is seen, and noisy air has many of them
              ctx.setLineDash([5, 4]);
              ctx.strokeStyle = colours.text;
              ctx.lineWidth = 1;
              ctx.stroke();
              ctx.setLineDash([]);
            }
          };
          line(middle, end, colours.print ? 1 : 0.55);
          line(start, middle, 1);
          ctx.globalAlpha = 1;
        }
      });
    },
  };
}
