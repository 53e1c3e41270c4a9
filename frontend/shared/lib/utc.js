/*
 * Moments as the desk writes them. Everything is UTC and linear in epoch minutes: no time zone of the browser, no
 * date library. A moment is a Date, milliseconds since 1970, or an ISO 8601 text.
 */
const MONTHS = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'];
const two = n => String(n).padStart(2, '0');

function date(moment) {
  const found = moment instanceof Date ? moment : new Date(moment);
  if (Number.isNaN(found.getTime())) throw new RangeError(`not a moment: ${moment}`);
  return found;
}

/** `1142Z`; seconds are cut, not rounded, as a clock does. */
export function hhmmZ(moment) {
  const d = date(moment);
  return `${two(d.getUTCHours())}${two(d.getUTCMinutes())}Z`;
}

/** `12 MAR 1142Z`. */
export function dayHhmmZ(moment) {
  return `${dayText(moment)} ${hhmmZ(moment)}`;
}

/** `12 MAR`. */
export function dayText(moment) {
  const d = date(moment);
  return `${two(d.getUTCDate())} ${MONTHS[d.getUTCMonth()]}`;
}

/** `1142Z` on the day of `today`, `12 MAR 1142Z` on any other. */
export function shortMoment(moment, today) {
  return dayText(moment) === dayText(today) && date(moment).getUTCFullYear() === date(today).getUTCFullYear()
    ? hhmmZ(moment) : dayHhmmZ(moment);
}

/** `12 MAR 1142:07Z`, the clock in the top bar. */
export function clockText(moment) {
  const d = date(moment);
  return `${dayText(d)} ${two(d.getUTCHours())}${two(d.getUTCMinutes())}:${two(d.getUTCSeconds())}Z`;
}

/** Minutes since 1970 as a number that may have a fraction. */
export function epochMinute(moment) {
  return date(moment).getTime() / 60000;
}

/** `2031-03-12T11:42Z` from epoch minutes, as form fields and addresses want it. */
export function isoMinute(minute) {
  return `${new Date(Math.round(minute) * 60000).toISOString().slice(0, 16)}Z`;
}

/** `2 h 04 min`, `37 min`, `3 d 2 h`; a negative span is written with a true minus. */
export function spanText(minutes) {
  const whole = Math.round(Math.abs(minutes));
  const sign = minutes < 0 && whole > 0 ? '\u2212' : '';
  if (whole < 60) return `${sign}${whole} min`;
  if (whole < 48 * 60) return `${sign}${Math.floor(whole / 60)} h ${two(whole % 60)} min`;
  return `${sign}${Math.floor(whole / 1440)} d ${Math.floor((whole % 1440) / 60)} h`;
}

const STEPS = [10, 15, 30, 60, 120, 180, 360, 720, 1440, 2880, 7200, 14400];

/**
 * Ticks of a time axis from `from` to `until` (epoch minutes): at most `most` of them, on round UTC steps, each
 * `{minute, label, date}`. The label is `06Z`, or `0630Z` where the step is under an hour; `date` is `12 MAR` under
 * every 00Z and otherwise null. From a step of one day on the label is the date alone.
 */
export function timeTicks(from, until, most) {
  if (!(until > from) || !(most >= 1)) return [];
  const step = STEPS.find(it => (until - from) / it <= most) ?? Math.ceil((until - from) / most / 1440) * 1440;
  const ticks = [];
  for (let minute = Math.ceil(from / step) * step; minute <= until; minute += step) {
    const midnight = minute % 1440 === 0;
    const clock = new Date(minute * 60000);
    const label = step < 60 ? hhmmZ(clock) : `${two(clock.getUTCHours())}Z`;
    ticks.push(step >= 1440
      ? { minute, label: dayText(clock), date: null }
      : { minute, label, date: midnight ? dayText(clock) : null });
  }
  return ticks;
}
