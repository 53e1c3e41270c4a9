/*
 * The time–height display: what was forecast beside what was observed, on one frame of time and flight level. It
 * reads one answer of /api/v1/time-height and draws; it writes nothing. Other pages embed it with show(element).
 *
 *   <section data-time-height="/api/v1/time-height?station=…" data-size="small">
 *     <p data-fallback>The picture needs scripts; the same numbers are in the tables below.</p>
 *   </section>
 */
import { bandField } from '../shared/charts/band-field.js';
import { columnNotes } from '../shared/charts/column-notes.js';
import { crossHair } from '../shared/charts/cross-hair.js';
import { forecastBoxes } from '../shared/charts/forecast-boxes.js';
import { evidenceStrip, STRIP_HEIGHT } from '../shared/charts/evidence-strip.js';
import { flightLevelAxis, kilometreAxis } from '../shared/charts/level-axis.js';
import { levelLines } from '../shared/charts/level-lines.js';
import { printPalette, screenPalette } from '../shared/charts/palette.js';
import { referenceLines } from '../shared/charts/reference-lines.js';
import { reportMarks } from '../shared/charts/report-marks.js';
import { utcAxis } from '../shared/charts/utc-axis.js';
import { deskTime } from '../shared/elements/clock.js';
import { make } from '../shared/elements/make.js';
import { dayHhmmZ, epochMinute } from '../shared/lib/utc.js';
import { columnAt, kilometreTicks, prepareColumns } from './columns.js';
import { following, moved, zoomed } from './cursor.js';
import { detailOf } from './detail.js';
import { paintField } from './field.js';
import { legend } from './legend.js';
import { readOutParts, spoken, valuesAt } from './read-out.js';
import { clustered, steppedReport } from './reports.js';
import { boxesAt, boxesOf, columnNotesOf, referencesOf, richardsonSegments, stoodBoxes } from './segments.js';

const WHOLE_HEIGHT = { low: 0, high: 450 };
const UPPER_HEIGHT = { low: 200, high: 450 };
const MARK_PX = 18;
// an A4 sheet across, less its margins, at 96 points to the inch; both panes and the legend fit one
const PAPER = { width: 1030, height: 198, pointsPerPixel: 3 };

export async function mount(root) {
  const hosts = [...root.querySelectorAll('[data-time-height]')];
  await Promise.all(hosts.map(show));
  // the tables stand open for whoever has no picture; beside one they fold up unless somebody came for them
  const tables = root.getElementById('tables');
  if (tables && hosts.length && hosts.every(host => host.dataset.drawn) && root.location.hash !== '#tables') tables.open = false;
}

/** Fills one element with the display; resolves when the first picture stands. */
export async function show(host) {
  const fallback = host.querySelector('[data-fallback]');
  if (typeof globalThis.Chart !== 'function') {
    say(fallback, "The chart library did not load, so there is no picture. The display's tables have the same numbers.");
    return;
  }
  let answer;
  try {
    const response = await fetch(host.dataset.timeHeight, { headers: { Accept: 'application/json' } });
    if (!response.ok) throw new Error(`the desk answered ${response.status}`);
    answer = await response.json();
  } catch (problem) {
    say(fallback, `The picture could not be loaded (${problem.message}). The display's tables have the same numbers; reload to try again.`);
    return;
  }
  fallback?.remove();
  new TimeHeight(host, answer).draw();
}

function say(fallback, words) {
  if (fallback) { fallback.textContent = words; fallback.className = 'notice'; }
}

class TimeHeight {
  constructor(host, answer) {
    this.host = host;
    this.small = host.dataset.size === 'small';
    this.whole = { from: epochMinute(answer.from), until: epochMinute(answer.until) };
    this.view = { ...this.whole };
    this.height = WHOLE_HEIGHT;
    this.columns = prepareColumns(answer.columns ?? []);
    this.boxes = boxesOf(answer.boxes ?? [], epochMinute);
    this.reports = (answer.reports ?? []).map(report => ({ ...report, minute: epochMinute(report.observedAt) }));
    this.display = { ...answer, columns: this.columns, boxes: this.boxes, reports: this.reports };
    this.stood = stoodBoxes(this.boxes).map(box => ({ ...box, from: box.stoodFrom, until: box.stoodUntil, superseded: false }));
    this.segments = richardsonSegments(this.columns);
    this.notes = columnNotesOf(this.columns, WHOLE_HEIGHT.high);
    this.references = referencesOf(this.columns);
    this.evidence = {
      soundings: this.columns.map(column => column.launchedMinute),
      reports: this.reports.map(report => report.minute),
    };
    this.cursor = null;
    this.choice = null;
    this.report = null;
    this.ghosts = true;
    this.palette = screenPalette(host);
    this.build();
  }

  build() {
    const pane = (name, title, about) => {
      const canvas = make('canvas', { 'aria-hidden': 'true' });
      const frame = make('div', {
        className: 'pane-frame', tabIndex: 0, role: 'application',
        'aria-label': `${title} pane, ${this.display.station.name}. Arrow keys move the cursor, with Shift further; `
          + 'plus and minus zoom; Enter opens what the cursor is on.',
      }, canvas);
      const figure = make('figure', { className: `pane is-${name}` },
        make('figcaption', {}, make('b', {}, title), ' ', make('small', {}, about)), frame);
      return { name, canvas, frame, figure };
    };
    const hidden = this.display.hiddenByDistance ?? 0;
    const unlevelled = this.display.withoutLevel ? `, ${this.display.withoutLevel} without a level` : '';
    this.observed = pane('observed', 'Observed',
      `Ri at a ${this.display.windowM} m window; reports within ${this.display.distanceNm} NM; ${hidden} hidden by distance${unlevelled}`);
    this.forecast = pane('forecast', 'Forecast', 'shear-layer forecasts in force and their earlier versions');
    this.panes = [this.observed, this.forecast];
    this.frameOfPanes = make('div', { className: 'panes' }, this.observed.figure, this.forecast.figure);
    this.line = make('p', { className: 'read-out', 'aria-hidden': 'true' });
    this.live = make('p', { className: 'visually-hidden', role: 'status' });
    this.detail = make('div', { className: 'time-height-detail' });
    const aside = this.small ? null
      : make('aside', { className: 'time-height-aside', 'aria-label': 'Legend and detail' }, legend(this.display), this.detail);
    this.host.classList.add('time-height');
    const main = make('div', { className: 'time-height-main' }, this.frameOfPanes, this.line, this.live, this.buttons());
    this.host.append(make('div', { className: 'time-height-body' }, main, aside));
    this.showLine();
    this.showDetail();
  }

  buttons() {
    if (this.small) return null;
    const button = (key, words, act, pressed) => {
      const element = make('button', { type: 'button', className: 'button', dataset: { key } },
        make('kbd', {}, key === '-' ? '\u2212' : key), words);
      if (pressed !== undefined) element.setAttribute('aria-pressed', String(pressed));
      element.addEventListener('click', () => act(element));
      return element;
    };
    return make('div', { className: 'button-row time-height-buttons' },
      button('S', 'Swap panes', () => this.swap()),
      button('G', 'Ghosts', element => {
        this.ghosts = !this.ghosts;
        element.setAttribute('aria-pressed', String(this.ghosts));
        this.redraw();
      }, true),
      button('U', 'Upper levels', element => {
        this.height = this.height === WHOLE_HEIGHT ? UPPER_HEIGHT : WHOLE_HEIGHT;
        element.setAttribute('aria-pressed', String(this.height === UPPER_HEIGHT));
        this.relay();
      }, false),
      make('span', { className: 'button-set' },
        button('B', 'Back a report', () => this.stepReport(-1)), button('N', 'Next report', () => this.stepReport(1))),
      make('span', { className: 'button-set' },
        button('E', 'Earlier sounding', () => this.stepColumn(-1)), button('L', 'Later sounding', () => this.stepColumn(1))),
      make('span', { className: 'button-set' },
        button('-', 'Wider', () => this.zoom(2)), button('+', 'Closer', () => this.zoom(0.5)),
        button('W', 'Whole range', () => this.look(this.whole))));
  }

  draw() {
    const palette = () => this.palette;
    const cursor = () => (this.palette.print ? null : this.cursor);
    const observed = [
      bandField(() => ({
        key: `${this.palette.print}|${this.palette.panel}|${this.palette.text}|${this.palette.bands.join(';')}`,
        paint: view => paintField(this.columns, view, this.palette),
      })),
      columnNotes(() => this.notes, palette),
      referenceLines(() => this.references, palette),
      levelLines(() => this.segments, palette),
      forecastBoxes(() => this.stood, palette, () => true),
      evidenceStrip(() => this.evidence, palette),
      reportMarks(chart => this.clusters(chart), palette),
      crossHair(cursor, palette),
    ];
    const forecast = [
      forecastBoxes(() => this.boxes.filter(box => this.ghosts || !box.superseded)
        .map(box => ({ ...box, chosen: this.choice?.kind === 'box' && this.choice.box === box })), palette),
      crossHair(cursor, palette),
    ];
    this.observed.chart = this.chart(this.observed, observed);
    this.forecast.chart = this.chart(this.forecast, forecast);
    for (const pane of this.panes) this.listen(pane);
    document.addEventListener('shearbook:colours', () => this.recolour(screenPalette(this.host)));
    // a browser does not lay out canvases again for paper by itself
    window.addEventListener('beforeprint', () => {
      this.recolour(printPalette(this.host));
      for (const { chart, frame } of this.panes) {
        Object.assign(frame.style, { width: `${PAPER.width}px`, height: `${PAPER.height}px` });
        chart.options.devicePixelRatio = PAPER.pointsPerPixel;
        chart.resize(PAPER.width, PAPER.height);
      }
    });
    window.addEventListener('afterprint', () => {
      this.recolour(screenPalette(this.host));
      for (const { chart, frame } of this.panes) {
        Object.assign(frame.style, { width: '', height: '' });
        chart.options.devicePixelRatio = undefined;
        chart.resize();
      }
    });
    this.host.dataset.drawn = 'yes';
  }

  chart(pane, plugins) {
    return new globalThis.Chart(pane.canvas, {
      type: 'scatter',
      data: { datasets: [] },
      plugins,
      options: { ...this.options(), events: [] },
    });
  }

  options() {
    const font = { family: this.palette.fontLabel, size: 12 };
    return {
      animation: false,
      normalized: true,
      responsive: true,
      maintainAspectRatio: false,
      layout: { padding: { top: STRIP_HEIGHT } },
      plugins: { legend: { display: false }, tooltip: { enabled: false } },
      scales: {
        x: utcAxis(this.view, this.palette, font),
        y: flightLevelAxis(this.height, this.palette, font),
        km: kilometreAxis(this.height, this.palette, font, () => this.kilometres()),
      },
    };
  }

  /** The right axis is read from the sounding under the cursor, or else from the newest one in view. */
  kilometres() {
    const analysed = this.columns.filter(column => column.analysed);
    const under = this.cursor && columnAt(this.columns, this.cursor.minute, this.cursor.level)?.column;
    const column = under?.analysed ? under
      : analysed.findLast(it => it.launchedMinute <= this.view.until) ?? analysed.at(-1);
    return column ? kilometreTicks(column, 2) : [];
  }

  clusters(chart) {
    const { chartArea: area, scales: { x, y } } = chart;
    const across = MARK_PX * (x.max - x.min) / Math.max(1, area.width);
    const up = MARK_PX * (y.max - y.min) / Math.max(1, area.height);
    return clustered(this.reports, across, up).map(cluster => ({
      ...cluster,
      chosen: this.choice?.kind === 'reports' && cluster.reports.some(it => this.choice.reports.includes(it)),
    }));
  }

  listen(pane) {
    const { frame } = pane;
    const at = event => {
      const box = pane.canvas.getBoundingClientRect();
      const { chartArea: area, scales: { x, y } } = pane.chart;
      const px = event.clientX - box.left;
      const py = event.clientY - box.top;
      if (px < area.left || px > area.right || py < area.top || py > area.bottom) return null;
      return { minute: x.getValueForPixel(px), level: y.getValueForPixel(py) };
    };
    let pressed = null;
    frame.addEventListener('pointermove', event => {
      const point = at(event);
      if (pressed && point && event.buttons === 1) {
        const shift = pressed.minute - point.minute;
        if (pressed.dragged || Math.abs(shift) > (this.view.until - this.view.from) * 0.01) {
          pressed.dragged = true;
          this.pan(shift);
          return;
        }
      }
      this.place(point, false);
    });
    frame.addEventListener('pointerleave', () => { if (document.activeElement !== frame) this.place(null, false); });
    frame.addEventListener('pointerdown', event => { pressed = event.button === 0 ? at(event) : null; });
    frame.addEventListener('pointerup', event => {
      const point = at(event);
      if (point && pressed && !pressed.dragged) { this.place(point, false); this.choose(pane); }
      pressed = null;
    });
    frame.addEventListener('keydown', event => {
      if (event.altKey || event.ctrlKey || event.metaKey) return;
      if (event.key === 'Enter') { event.preventDefault(); this.choose(pane); return; }
      if (event.key === 'Escape') { this.choice = null; this.place(null, true); this.showDetail(); return; }
      const zoom = { '+': 0.5, '=': 0.5, '-': 2, '_': 2 }[event.key];
      if (zoom) { event.preventDefault(); this.zoom(zoom); return; }
      const next = moved(this.cursor ?? this.start(), event.key, event.shiftKey, { ...this.whole, ...this.height });
      if (!next) return;
      event.preventDefault();
      this.place(next, true);
    });
    frame.addEventListener('focus', () => { if (!this.cursor) this.place(this.start(), true); });
  }

  /** Where the cursor starts: on the lowest Ri of the newest sounding in view would hide the question, so mid-frame. */
  start() {
    return { minute: Math.round((this.view.from + this.view.until) / 120) * 60, level: 300 };
  }

  place(point, byKey) {
    this.cursor = point;
    this.report = null;
    if (point && byKey) this.look(following(this.view, point.minute, this.whole));
    this.showLine();
    if (byKey) this.live.textContent = point ? spoken(valuesAt(this.display, point.minute, point.level), this.display.windowM) : '';
    this.requestDraw();
  }

  showLine() {
    if (!this.cursor) {
      const { station, from, until, asKnownAt } = this.display;
      const known = asKnownAt ? ` as known at ${dayHhmmZ(asKnownAt)}` : '';
      this.line.replaceChildren(make('span', {}, `${station.name}, ${dayHhmmZ(from)} to ${dayHhmmZ(until)}${known}`));
      return;
    }
    const values = valuesAt(this.display, this.cursor.minute, this.cursor.level);
    this.line.replaceChildren(...readOutParts(values, this.display.windowM).map(part => make('span', {}, part)));
  }

  showDetail() {
    const now = deskTime(document);
    this.detail.replaceChildren(...detailOf(this.choice, this.display, now === null ? null : now / 60000));
  }

  /** What the cursor is on: a report within reach, then a box (the smallest), then a sounding. */
  choose(pane) {
    if (!this.cursor) return;
    const { minute, level } = this.cursor;
    const { chartArea: area, scales: { x, y } } = pane.chart;
    const reach = 14;
    const near = pane === this.observed ? this.clusters(pane.chart).filter(it =>
      Math.abs(it.minute - minute) * area.width / (x.max - x.min) <= reach
      && Math.abs(it.level - level) * area.height / (y.max - y.min) <= reach)
      .sort((a, b) => Math.abs(a.minute - minute) - Math.abs(b.minute - minute))[0] : null;
    const box = boxesAt(this.boxes, minute, level).sort((a, b) => (a.until - a.from) - (b.until - b.from))[0]
      ?? this.boxes.find(it => minute >= it.from && minute <= it.until && level >= it.base && level <= it.top);
    const column = columnAt(this.columns, minute, level)?.column;
    const ofPane = pane === this.forecast ? [box && { kind: 'box', box }, column && { kind: 'column', column }]
      : [column && { kind: 'column', column }, box && { kind: 'box', box }];
    this.choice = near ? { kind: 'reports', reports: near.reports } : ofPane.find(Boolean) ?? null;
    this.showDetail();
    this.redraw();
  }

  stepReport(step) {
    const report = steppedReport(this.reports, this.report, this.cursor?.minute ?? (step > 0 ? this.view.from : this.view.until), step);
    if (!report) { this.live.textContent = step > 0 ? 'No later report.' : 'No earlier report.'; return; }
    this.place({ minute: report.minute, level: report.flightLevel }, true);
    this.report = report;
    this.choice = { kind: 'reports', reports: [report] };
    this.showDetail();
    this.redraw();
  }

  stepColumn(step) {
    const minute = this.cursor?.minute ?? (step > 0 ? this.whole.from - 1 : this.whole.until + 1);
    const current = this.choice?.kind === 'column' ? this.columns.indexOf(this.choice.column) : -1;
    const column = current >= 0 ? this.columns[current + step]
      : step > 0 ? this.columns.find(it => it.launchedMinute > minute) : this.columns.findLast(it => it.launchedMinute < minute);
    if (!column) { this.live.textContent = step > 0 ? 'No later sounding.' : 'No earlier sounding.'; return; }
    const level = this.cursor?.level ?? 300;
    this.choice = { kind: 'column', column };
    this.place({ minute: column.minute[0] + level / 9.84, level }, true);
    this.showDetail();
  }

  swap() {
    this.frameOfPanes.append(this.frameOfPanes.firstElementChild);
    this.redraw();
  }

  zoom(factor) {
    const centre = this.cursor?.minute ?? (this.view.from + this.view.until) / 2;
    this.look(zoomed(this.view, factor, centre, this.whole));
  }

  pan(minutes) {
    const span = this.view.until - this.view.from;
    const from = Math.max(this.whole.from, Math.min(this.view.from + minutes, this.whole.until - span));
    this.look({ from, until: from + span });
  }

  look(view) {
    if (view.from === this.view.from && view.until === this.view.until) return;
    this.view = { from: view.from, until: view.until };
    for (const { chart } of this.panes) {
      chart.options.scales.x.min = view.from;
      chart.options.scales.x.max = view.until;
      chart.update('none');
    }
  }

  recolour(palette) {
    this.palette = palette;
    this.relay();
  }

  /** Lays the axes again after a change of colours or heights. */
  relay() {
    for (const { chart } of this.panes) {
      Object.assign(chart.options.scales, this.options().scales);
      chart.update('none');
    }
  }

  redraw() {
    for (const { chart } of this.panes) chart.update('none');
  }

  /** Cursor moves come faster than frames; one draw a frame is enough. */
  requestDraw() {
    if (this.waiting) return;
    this.waiting = true;
    requestAnimationFrame(() => {
      this.waiting = false;
      for (const { chart } of this.panes) chart.draw();
    });
  }
}
