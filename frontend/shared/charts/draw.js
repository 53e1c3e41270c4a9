/* What several plugins draw: a line or a text that stands out from any field colour by a halo of its own. */

/** Runs `draw` with everything outside the chart's area cut off. */
export function inside(chart, draw) {
  const { ctx, chartArea: area } = chart;
  ctx.save();
  ctx.beginPath();
  ctx.rect(area.left, area.top, area.width, area.height);
  ctx.clip();
  draw(ctx, area);
  ctx.restore();
}

/** Strokes the current path twice: first the halo, then the line. */
export function strokeWithHalo(ctx, colour, halo, width, dash = []) {
  ctx.lineJoin = 'round';
  ctx.lineCap = dash.length ? 'butt' : 'round';
  ctx.setLineDash([]);
  ctx.strokeStyle = halo;
  ctx.lineWidth = width + 2.5;
  ctx.stroke();
  ctx.setLineDash(dash);
  ctx.strokeStyle = colour;
  ctx.lineWidth = width;
  ctx.stroke();
  ctx.setLineDash([]);
}

export function textWithHalo(ctx, text, x, y, colour, halo) {
  ctx.lineJoin = 'round';
  ctx.setLineDash([]);
  ctx.lineWidth = 3.5;
  ctx.strokeStyle = halo;
  ctx.strokeText(text, x, y);
  ctx.fillStyle = colour;
  ctx.fillText(text, x, y);
}

export const labelFont = (palette, size = 12, weight = 400) => `${weight} ${size}px ${palette.fontLabel}`;
export const textFont = (palette, size = 12, weight = 400) => `${weight} ${size}px ${palette.fontText}`;
