/*
 * Chart.js plugin: a field painted once into an image and only copied on every draw. `source(chart)` gives
 * `{key, paint(view)}`; the image is painted again when the key or the size changes, never for a cursor.
 */
export function bandField(source) {
  let image = null;
  let painted = '';
  return {
    id: 'bandField',
    beforeDatasetsDraw(chart) {
      const field = source(chart);
      if (!field) return;
      const { ctx, chartArea: area, scales: { x, y } } = chart;
      const scale = chart.currentDevicePixelRatio;
      const width = Math.max(1, Math.round(area.width * scale));
      const height = Math.max(1, Math.round(area.height * scale));
      const key = [field.key, width, height, x.min, x.max, y.min, y.max].join('|');
      if (key !== painted) {
        const view = { from: x.min, until: x.max, low: y.min, high: y.max, width, height, scale };
        image = new OffscreenCanvas(width, height);
        image.getContext('2d').putImageData(new ImageData(field.paint(view), width, height), 0, 0);
        painted = key;
      }
      ctx.save();
      ctx.imageSmoothingEnabled = false;
      ctx.drawImage(image, area.left, area.top, area.width, area.height);
      ctx.restore();
    },
  };
}
