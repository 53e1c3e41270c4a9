/*
 * Two axes of height that mean different things: flight level on the left, kilometres on the right. They are tied
 * together only by a sounding's own levels, so the right one takes its ticks from the sounding it names.
 */
export const AXIS_WIDTH = 46;

export function flightLevelAxis(range, palette, font) {
  return {
    type: 'linear',
    position: 'left',
    min: range.low,
    max: range.high,
    border: { color: palette.line },
    grid: { color: palette.hair, tickColor: palette.line, tickLength: 5 },
    afterFit(axis) { axis.width = AXIS_WIDTH; },
    afterBuildTicks(axis) {
      const step = axis.height / ((range.high - range.low) / 50) < 22 ? 100 : 50;
      const first = Math.ceil(range.low / step) * step;
      axis.ticks = [];
      for (let level = first; level <= range.high; level += step) axis.ticks.push({ value: level });
    },
    ticks: {
      autoSkip: false,
      color: palette.second,
      font,
      padding: 3,
      callback: value => `FL${String(value).padStart(3, '0')}`,
    },
  };
}

/** `ticks()` gives `{flightLevel, km}` pairs of the sounding the axis is read from, bottom first. */
export function kilometreAxis(range, palette, font, ticks) {
  return {
    type: 'linear',
    position: 'right',
    min: range.low,
    max: range.high,
    border: { color: palette.line },
    grid: { drawOnChartArea: false, tickColor: palette.line, tickLength: 5 },
    afterFit(axis) { axis.width = AXIS_WIDTH; },
    afterBuildTicks(axis) {
      axis.ticks = ticks().filter(tick => tick.flightLevel >= range.low && tick.flightLevel <= range.high)
        .map(tick => ({ value: tick.flightLevel, km: tick.km }));
    },
    ticks: {
      autoSkip: false,
      color: palette.second,
      font,
      padding: 3,
      callback: (value, index, all) => `${all[index].km} km`,
    },
  };
}
