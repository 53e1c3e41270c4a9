/* Chart.js plugin: the cursor all panes share. `source()` gives `{minute, level}` or null. */
export function crossHair(source, palette) {
  return {
    id: 'crossHair',
    afterDraw(chart) {
      const cursor = source();
      if (!cursor) return;
      const { ctx, chartArea: area, scales: { x, y } } = chart;
      const across = Math.round(x.getPixelForValue(cursor.minute)) + 0.5;
      const height = Math.round(y.getPixelForValue(cursor.level)) + 0.5;
      const colours = palette();
      ctx.save();
      for (const [style, width] of [[colours.halo, 3], [colours.focus, 1]]) {
        ctx.strokeStyle = style;
        ctx.lineWidth = width;
        ctx.beginPath();
        if (across >= area.left && across <= area.right) { ctx.moveTo(across, area.top); ctx.lineTo(across, area.bottom); }
        if (height >= area.top && height <= area.bottom) { ctx.moveTo(area.left, height); ctx.lineTo(area.right, height); }
        ctx.stroke();
      }
      ctx.restore();
    },
  };
}
