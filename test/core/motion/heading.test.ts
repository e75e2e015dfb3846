import { describe, expect, test } from 'vitest';
import { headingOf } from '../../../src/core/motion/heading.ts';

const heading = (...texts: string[]) => headingOf(texts.map((text, i) => ({ line: i + 1, text })));

describe('the interval, as heading lines say it', () => {
  test.each([
    ['NPTS= 4000, DT= .0100 SEC', 0.01],
    ['NPTS=  4000, DT=   .0050 SEC,', 0.005],
    ['4000 0.0100 NPTS, DT', 0.01],
    ['interval 0.02 s   unit cm/s2   values 2401', 0.02],
    ['#1559 points at equal spacing of 0.02 sec', 0.02],
    ['AT EQUAL INTERVALS OF 0.02 SEC', 0.02],
    ['time step: 5 ms', 0.005],
    ['dt (s) = 1.0D-02', 0.01],
    ['Δt = 0.004', 0.004],
    ['Sampling interval (ms): 10', 0.01],
    ['sampling rate: 200 Hz', 0.005],
    ['Sampling Freq(Hz) 100Hz', 0.01],
    ['sample rate 0.01 s', 0.01],
    ['recorded with 250 samples per second', 0.004],
    ['500 sps', 0.002],
    ['values at 0.02 seconds', 0.02],
  ])('%s', (text, interval) => {
    expect(heading(text).interval?.value).toBeCloseTo(interval, 15);
  });

  test('two that differ are left to the user, the same one twice is not', () => {
    expect(heading('dt = 0.01 s', 'time step 0.02 s')).toMatchObject({
      interval: null,
      disputed: [{ what: 'interval', lines: [1, 2] }],
    });
    expect(heading('dt = 0.01 s', 'sampling interval 10 ms').interval?.value).toBe(0.01);
  });

  test('the interval outweighs the rate of the recorder', () => {
    expect(heading('recorder: 200 samples per second', 'dt = 0.02 s').interval?.value).toBe(0.02);
  });

  test('filters, dates and places are no interval', () => {
    for (const text of ['band-pass 0.1 Hz to 25 Hz', '1940 05 19', 'station 117 at 32.8 N', 'width 0.02', 'plot 3'])
      expect(heading(text).interval).toBeNull();
  });

  test('says where it stands', () => {
    const text = '#1559 points at equal spacing of 0.02 sec';
    const said = heading('a title', text).interval;
    expect(said?.line).toBe(2);
    expect(text.slice(...(said?.span ?? [0, 0]))).toBe('spacing of 0.02 sec');
  });
});

describe('the count', () => {
  test.each([
    ['NPTS= 4000, DT= .0100 SEC', 4000],
    ['4000 0.0100 NPTS, DT', 4000],
    ['interval 0.02 s   unit cm/s2   values 2401', 2401],
    ['#1559 points at equal spacing of 0.02 sec', 1559],
    ['number of points: 6001', 6001],
    ['No. of samples = 1 200', 1200],
    ['4,000 acceleration values', 4000],
  ])('%s', (text, count) => {
    expect(heading(text).count?.value).toBe(count);
  });

  test('a rate and the values of a line are no count', () => {
    for (const text of ['200 samples per second', '8 values per line', '8 points across in a row', '5 values a line'])
      expect(heading(text).count).toBeNull();
  });
});

describe('the unit', () => {
  test.each([
    ['#The units are (g)', 'g'],
    ['UNITS OF G', 'g'],
    ["unit: g's", 'g'],
    ['Time (s), Acceleration (g)', 'g'],
    ['Acceleration, g', 'g'],
    ['ACCELERATION TIME HISTORY IN UNITS OF G', 'g'],
    ['unit cm/s2', 'cm/s2'],
    ['cm/s/s', 'cm/s2'],
    ['accelerations in cm/sec^2', 'cm/s2'],
    ['CM/SEC/SEC', 'cm/s2'],
    ['acc [gal]', 'cm/s2'],
    ['Unit: Gals', 'cm/s2'],
    ['Beschleunigung m/s²', 'm/s2'],
    ['a (m/s^2)', 'm/s2'],
    ['m/s**2', 'm/s2'],
    ['m s-2', 'm/s2'],
    ['metres per second squared', 'm/s2'],
    ['mm/s2', 'mm/s2'],
    ['acc (mm/sec2)', 'mm/s2'],
  ])('%s', (text, unit) => {
    expect(heading(text).unit?.value).toBe(unit);
  });

  test.each([
    ['units ft/s2'],
    ['acc (in/sec2)'],
    ['units: %g'],
    ['units (mg)'],
    ['acceleration in g/10'],
    ['unit 0.001 g'],
    ['unit: 0.1 cm/s2'],
    ['units: counts'],
    ['mgal'],
  ])('%s is none of ours, and said to be none', (text) => {
    expect(heading(text).unit?.value).toBe('unknown');
  });

  test('velocities, peaks, weights and names are no unit of acceleration', () => {
    for (const text of [
      'velocity in cm/s',
      'peak 312.3 cm/s2',
      'peak acceleration 0.34 g',
      'Mag 6.9',
      'G. Smith',
      'page 3 g 4',
    ])
      expect(heading(text).unit).toBeNull();
  });

  test('two that differ are left to the user; a phrase about units outweighs a mention', () => {
    expect(heading('units: g', 'units: cm/s2')).toMatchObject({
      unit: null,
      disputed: [{ what: 'unit', lines: [1, 2] }],
    });
    expect(heading('trigger in cm/s2', 'units: g').unit?.value).toBe('g');
  });
});

test('event, station and component where they are labelled', () => {
  expect(heading('Event: Long Valley   Station: Mill, basement', 'component 180, as recorded')).toMatchObject({
    event: { value: 'Long Valley', line: 1 },
    station: { value: 'Mill', line: 1 },
    component: { value: '180', line: 2 },
  });
  expect(heading('Eskfoot, old pumping house')).toMatchObject({ event: null, station: null, component: null });
});

test('long and hostile lines are read in no time worth noting', () => {
  for (const part of ['1 ', 'unit ', 'dt', 'spacing of ', 'g ', '((', 'sampling rate ', '1,111 ', 'acc ']) {
    const { disputed } = heading(part.repeat(400).slice(0, 400));
    expect(disputed.length).toBeLessThanOrEqual(2);
  }
});
