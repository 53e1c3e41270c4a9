/* How keys move the cursor: 5 minutes and 100 ft, with Shift an hour and 1000 ft. */
const MINUTES = { plain: 5, shift: 60 };
const LEVELS = { plain: 1, shift: 10 };
const STEPS = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };

/** The cursor after a key, held inside the frame; null if the key does not move it. */
export function moved(cursor, key, shift, frame) {
  const step = STEPS[key];
  if (!step && key !== 'Home' && key !== 'End') return null;
  const size = shift ? 'shift' : 'plain';
  const minute = key === 'Home' ? frame.from : key === 'End' ? frame.until
    : snapped(cursor.minute, MINUTES[size], step[0]);
  const level = step ? snapped(cursor.level, LEVELS[size], step[1]) : cursor.level;
  return {
    minute: Math.min(frame.until, Math.max(frame.from, minute)),
    level: Math.min(frame.high, Math.max(frame.low, level)),
  };
}

/** One step on, landing on whole steps, so that numbers read out are round. */
function snapped(value, step, direction) {
  if (direction === 0) return value;
  return direction > 0 ? Math.floor(value / step + 1e-9) * step + step : Math.ceil(value / step - 1e-9) * step - step;
}

/** A window on time after zooming by `factor` about `centre`, kept inside the whole and never under half an hour. */
export function zoomed(view, factor, centre, whole) {
  const span = Math.min(whole.until - whole.from, Math.max(30, (view.until - view.from) * factor));
  const share = (centre - view.from) / (view.until - view.from);
  return placed(centre - share * span, span, whole);
}

/** A window moved so that `minute` lies inside it. */
export function following(view, minute, whole) {
  const span = view.until - view.from;
  const margin = span * 0.1;
  if (minute < view.from + margin) return placed(minute - margin, span, whole);
  if (minute > view.until - margin) return placed(minute + margin - span, span, whole);
  return view;
}

function placed(from, span, whole) {
  const start = Math.max(whole.from, Math.min(from, whole.until - span));
  return { from: start, until: start + span };
}
