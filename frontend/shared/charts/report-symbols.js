/*
 * The symbols of air-reports, centred on the origin in a frame of 20 by 20 times `size`; symbols.svg has the same
 * shapes for text. Moderate and severe are the standard peaks; nil, light and extreme are marks of the office.
 */
const PATHS = {
  NIL: [],
  LGT: [[-5, -3, 5, -3]],
  MOD: [[-7, 5, 0, -5, 7, 5]],
  SEV: [[-7, 1, 0, -7, 7, 1], [-7, 8, 0, 0, 7, 8]],
  EXTRM: [[-9, 1, -3, -7, 3, 1], [-9, 8, -3, 0, 3, 8], [4.5, -3, 8.5, 2], [8.5, -3, 4.5, 2]],
};

/** Strokes the symbol with the context's own stroke style. */
export function traceSymbol(ctx, intensity, size = 1) {
  ctx.beginPath();
  for (const points of PATHS[intensity] ?? []) {
    for (let at = 0; at < points.length; at += 2) {
      if (at) ctx.lineTo(points[at] * size, points[at + 1] * size);
      else ctx.moveTo(points[0] * size, points[1] * size);
    }
  }
  if (intensity === 'NIL') { ctx.moveTo(4 * size, 0); ctx.arc(0, 0, 4 * size, 0, 2 * Math.PI); }
  if (intensity === 'LGT') { ctx.moveTo(1 * size, 3 * size); ctx.arc(0, 3 * size, 1 * size, 0, 2 * Math.PI); }
  ctx.stroke();
}

export const KNOWN = Object.freeze(Object.keys(PATHS));
