/*
 * Chart.js plugin: one line above the field that shows when anything was received at all: a block for a sounding's
 * release, a tick for a report. `source()` gives `{soundings: [minute], reports: [minute]}`. Its height is kept free
 * by the chart's upper padding.
 */
export const STRIP_HEIGHT = 12;

export function evidenceStrip(source, palette) {
  return {
    id: 'evidenceStrip',
    afterDraw(chart) {
      const { ctx, chartArea: area, scales: { x } } = chart;
      const colours = palette();
      const { soundings, reports } = source();
      const bottom = area.top - 3;
      ctx.save();
      ctx.strokeStyle = colours.hair;
      ctx.lineWidth = 1;
      ctx.beginPath();
      ctx.moveTo(area.left, bottom + 0.5);
      ctx.lineTo(area.right, bottom + 0.5);
      ctx.stroke();
      const within = minute => minute >= x.min && minute <= x.max;
      ctx.fillStyle = colours.text;
      for (const minute of soundings.filter(within)) ctx.fillRect(x.getPixelForValue(minute) - 3, bottom - 7, 6, 7);
      ctx.strokeStyle = colours.second;
      ctx.beginPath();
      for (const minute of reports.filter(within)) {
        const at = Math.round(x.getPixelForValue(minute)) + 0.5;
        ctx.moveTo(at, bottom);
        ctx.lineTo(at, bottom - 5);
      }
      ctx.stroke();
      ctx.restore();
    },
  };
}
