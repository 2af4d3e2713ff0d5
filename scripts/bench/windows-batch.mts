import { windowsFor } from '../../src/sky/windows';
import { SPAN, inventedSources, inventedStations } from './invented-sky';
import { medianSeconds, report } from './measure';
import { ROUTE, engineWindows } from './peers/engine-route';

const SAMPLE = 24;
const sources = inventedSources(300);
const stations = inventedStations(12, true);
const n = sources.length * stations.length;

const seconds = medianSeconds(() => windowsFor(sources, stations, SPAN).length);
const pairs = Array.from({ length: SAMPLE }, (_, index) => ({
  source: sources[(index * 13) % sources.length],
  station: stations[index % stations.length],
}));
const began = performance.now();
let found = 0;
for (const { source, station } of pairs) {
  if (source && station) found += engineWindows(source, station, SPAN).length;
}
if (found === 0) throw new Error('The peer saw nothing rise');
const sampleSeconds = (performance.now() - began) / 1000;

report({
  name: 'windows-batch',
  unit: 'ms',
  n,
  seconds,
  peer: {
    peer: `${ROUTE}, each minute, edges halved: ${SAMPLE} of ${n} pairs timed and scaled`,
    seconds: (sampleSeconds * n) / SAMPLE,
  },
  wanted: { atMost: 6, ratioAtLeast: 2000 },
});

const open = inventedStations(12, false);
report({
  name: 'windows-batch-open',
  unit: 'ms',
  n,
  seconds: medianSeconds(() => windowsFor(sources, open, SPAN).length),
  wanted: { atMost: 1 },
});
