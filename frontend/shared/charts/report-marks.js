/*
 * Chart.js plugin: air-reports at their time and level. A base line means automated, a dot under it in cloud, a slash
 * excluded from scoring. Where several stand on one spot the heaviest is drawn with their number. `source(chart)`
 * gives clusters `{minute, level, reports, worst, chosen}`.
 */
import { inside, labelFont, textWithHalo } from './draw.js';
import { traceSymbol } from './report-symbols.js';

export function reportMarks(source, palette) {
  return {
    id: 'reportMarks',
    afterDatasetsDraw(chart) {
      const { x, y } = chart.scales;
      const colours = palette();
      inside(chart, ctx => {
        for (const cluster of source(chart)) {
          const report = cluster.worst;
          ctx.save();
          ctx.translate(x.getPixelForValue(cluster.minute), y.getPixelForValue(cluster.level));
          ctx.lineJoin = 'round';
          ctx.lineCap = 'round';
          const ink = report.excluded ? colours.second : colours.mark;
          for (const [style, wider] of [[colours.halo, 4], [ink, 0]]) {
            ctx.strokeStyle = style;
            ctx.lineWidth = 2 + wider;
            traceSymbol(ctx, report.intensity, 0.9);
            details(ctx, report, wider);
          }
          if (cluster.chosen) {
            ctx.strokeStyle = colours.focus;
            ctx.lineWidth = 2;
            ctx.strokeRect(-13, -13, 26, 28);
          }
          if (cluster.reports.length > 1) {
            ctx.font = labelFont(colours, 12, 600);
            ctx.textAlign = 'left';
            ctx.textBaseline = 'middle';
            textWithHalo(ctx, String(cluster.reports.length), 9, -7, colours.mark, colours.halo);
          }
          ctx.restore();
        }
      });
    },
  };
}

function details(ctx, report, wider) {
  if (report.automated) {
    ctx.beginPath();
    ctx.moveTo(-7, 10.5);
    ctx.lineTo(7, 10.5);
    ctx.stroke();
  }
  if (report.inCloud) {
    ctx.beginPath();
    ctx.arc(0, 14, 0.8, 0, 2 * Math.PI);
    ctx.stroke();
  }
  if (report.excluded) {
    ctx.lineWidth = 1.5 + wider;
    ctx.beginPath();
    ctx.moveTo(-8, 9);
    ctx.lineTo(8, -9);
    ctx.stroke();
  }
}
