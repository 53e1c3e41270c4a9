/*
 * Chart.js plugin: tropopause (chain line, `TROP FL368`) and level of the highest wind (`J 131 kt FL347`) of each
 * sounding. `source()` gives `{from, until, flightLevel, kind: 'tropopause'|'jet', text, open}`; open means that the
 * highest wind was at the top of the observed levels and may lie higher, drawn as a tick upward.
 */
import { inside, labelFont, strokeWithHalo, textWithHalo } from './draw.js';
import { labelRoom } from './label-room.js';

const CHAIN = [12, 3, 2, 3];

export function referenceLines(source, palette) {
  return {
    id: 'referenceLines',
    beforeDatasetsDraw(chart) {
      const { x, y } = chart.scales;
      const colours = palette();
      inside(chart, (ctx, area) => {
        ctx.font = labelFont(colours);
        ctx.textBaseline = 'alphabetic';
        const room = labelRoom();
        for (const line of source()) {
          const left = x.getPixelForValue(line.from);
          const right = x.getPixelForValue(line.until);
          const height = y.getPixelForValue(line.flightLevel);
          if (right < area.left || left > area.right) continue;
          ctx.beginPath();
          ctx.moveTo(left, height);
          ctx.lineTo(right, height);
          strokeWithHalo(ctx, colours.text, colours.halo, 1.25, line.kind === 'tropopause' ? CHAIN : []);
          if (line.open) {
            ctx.beginPath();
            ctx.moveTo(left, height);
            ctx.lineTo(left, height - 9);
            strokeWithHalo(ctx, colours.text, colours.halo, 1.25);
          }
          const width = ctx.measureText(line.text).width;
          const at = Math.min(Math.max(left, area.left) + 3, area.right - width - 3);
          ctx.textAlign = 'left';
          const base = line.kind === 'tropopause' ? height - 5 : height + 13;
          // a label that would cover another one is left out; the detail and the tables have the number
          if (room.take(at, [base - 11], width + 6, 14) === null) continue;
          textWithHalo(ctx, line.text, at, base, colours.text, colours.halo);
        }
      });
    },
  };
}
