/* A linear Chart.js axis in epoch minutes with UTC labels of our own: `06Z`, and the date under 00Z. */
import { timeTicks } from '../lib/utc.js';

export function utcAxis(range, palette, font) {
  let ticks = [];
  return {
    type: 'linear',
    position: 'bottom',
    min: range.from,
    max: range.until,
    offset: false,
    bounds: 'data',
    border: { color: palette.line },
    grid: { color: palette.hair, tickColor: palette.line, tickLength: 5 },
    afterBuildTicks(axis) {
      ticks = timeTicks(axis.min, axis.max, Math.max(2, Math.floor(axis.chart.width / 64)));
      axis.ticks = ticks.map(tick => ({ value: tick.minute }));
    },
    ticks: {
      autoSkip: false,
      maxRotation: 0,
      color: palette.second,
      font,
      padding: 2,
      callback: (value, index) => {
        const tick = ticks[index];
        // every label has two lines, so that panes with and without a date keep the same height
        return tick ? [tick.label, tick.date ?? ''] : '';
      },
    },
  };
}
