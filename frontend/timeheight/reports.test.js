import { test } from 'node:test';
import assert from 'node:assert/strict';
import { clustered, nearestReport, steppedReport } from './reports.js';

const report = (reportId, minute, flightLevel, intensity = 'MOD', more = {}) =>
  ({ reportId, minute, flightLevel, intensity, distanceNm: 10, ...more });

test('reports on one spot become one mark with the heaviest on top', () => {
  const clusters = clustered([report('a', 0, 290), report('b', 3, 291, 'SEV'), report('c', 60, 290)], 10, 5);
  assert.equal(clusters.length, 2);
  assert.equal(clusters[0].reports.length, 2);
  assert.equal(clusters[0].worst.reportId, 'b');
  assert.equal(clusters[0].minute, 3);
});

test('a report left out of scoring does not speak for its cluster', () => {
  const [cluster] = clustered([report('a', 0, 290, 'LGT'), report('b', 1, 290, 'SEV', { excluded: true })], 10, 5);
  assert.equal(cluster.worst.reportId, 'a');
  assert.equal(cluster.reports.length, 2);
});

test('clustering loses no report and repeats none, whatever the grouping', () => {
  const seed = 20310312;
  let state = seed;
  const random = () => { state = (state * 1103515245 + 12345) % 2147483648; return state / 2147483648; };
  for (let round = 0; round < 50; round++) {
    const reports = Array.from({ length: 60 }, (_, index) => report(String(index), random() * 1440, random() * 450));
    const ids = clustered(reports, random() * 60, random() * 30).flatMap(it => it.reports.map(one => one.reportId));
    assert.equal(ids.length, 60, `seed ${seed}, round ${round}`);
    assert.equal(new Set(ids).size, 60, `seed ${seed}, round ${round}`);
  }
});

test('the nearest report counts time, level and distance', () => {
  const reports = [report('a', 0, 290, 'MOD', { distanceNm: 110 }), report('b', 20, 290, 'MOD', { distanceNm: 0 })];
  assert.equal(nearestReport(reports, 0, 290).reportId, 'b');
  assert.equal(nearestReport([], 0, 290), null);
});

test('stepping goes through every report once and stops at the ends', () => {
  const reports = [report('b', 10, 300), report('a', 10, 290), report('c', 50, 290)];
  const seen = [];
  let current = null;
  while ((current = steppedReport(reports, current, 0, 1))) seen.push(current.reportId);
  assert.deepEqual(seen, ['a', 'b', 'c']);
  assert.equal(steppedReport(reports, null, 49, -1).reportId, 'b');
  assert.equal(steppedReport(reports, reports[1], 10, -1), null);
});
