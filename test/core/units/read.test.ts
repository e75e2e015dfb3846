import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  fromDisplay,
  printQuantity,
  printRatio,
  printShort,
  printTyped,
  type Quantity,
  type System,
} from '../../../src/core/units/quantities.ts';
import { readColumn, readQuantity } from '../../../src/core/units/read.ts';

const value = (text: string, quantity: Quantity, system: System = 'si', current: number | null = null) => {
  const reading = readQuantity(text, quantity, system, current);
  return reading.kind === 'value' ? reading.value : reading.kind;
};
const QUANTITIES: readonly Quantity[] = [
  'length',
  'drift',
  'weight',
  'force',
  'stiffness',
  'moment',
  'energy',
  'acceleration',
  'velocity',
  'time',
  'percent',
  'ratio',
];

describe('[UNI-1] a typed text', () => {
  test.each<[string, Quantity, System, number]>([
    ['3.6', 'length', 'si', 3.6],
    ['3,6', 'length', 'si', 3.6],
    ['3600 mm', 'length', 'si', 3.6],
    ['12 ft', 'length', 'si', 12 * 0.3048],
    ['12 ft 6 in', 'length', 'si', 12.5 * 0.3048],
    ['12\' 6"', 'length', 'us', 12.5 * 0.3048],
    ['12', 'length', 'us', 12 * 0.3048],
    ['250 kN', 'force', 'us', 250e3],
    ['56 kip', 'force', 'si', 56 * 4448.2216152605],
    ['56 KIP', 'force', 'si', 56 * 4448.2216152605],
    ['455', 'stiffness', 'si', 455e6],
    ['455 kN/mm', 'stiffness', 'us', 455e6],
    ['4.55e8 N/m', 'stiffness', 'si', 4.55e8],
    ['31.54 kip/in', 'stiffness', 'si', (31.54 * 4448.2216152605) / 0.0254],
    ['412 t', 'weight', 'si', 412e3],
    ['7 250', 'weight', 'si', 7250e3 / 9.80665],
    ['7\u202f250', 'weight', 'si', 7250e3 / 9.80665],
    ['1,250,000', 'ratio', 'si', 1250000],
    ['1.250,5', 'ratio', 'si', 1250.5],
    ['1,250.5', 'ratio', 'si', 1250.5],
    ['0,125', 'ratio', 'si', 0.125],
    ['1,25', 'ratio', 'si', 1.25],
    ['.5', 'ratio', 'si', 0.5],
    ['455*1.1', 'ratio', 'si', 500.50000000000006],
    ['(2+3)*4 - 1', 'ratio', 'si', 19],
    ['1.250.000', 'ratio', 'si', 1250000],
    ['1 250,300', 'ratio', 'si', 1250.3],
    ['1250,300', 'ratio', 'si', 1250.3],
    ['+10', 'ratio', 'si', 10],
    ['-5', 'ratio', 'si', -5],
    ['12\'-6"', 'length', 'si', 12.5 * 0.3048],
    ['12’–6”', 'length', 'si', 12.5 * 0.3048],
    ['2*12\'-6"', 'length', 'si', 25 * 0.3048],
    ['20 kip-ft', 'moment', 'si', 20 * 4448.2216152605 * 0.3048],
    ['20 kNm', 'moment', 'si', 20e3],
    ['3600 MM', 'length', 'si', 3.6],
    ['2 MN', 'force', 'si', 2e6],
    ['0.7', 'percent', 'si', 0.007],
    ['1/2', 'percent', 'si', 0.005],
    ['−3', 'ratio', 'si', -3],
    ['3 m + 600 mm', 'length', 'si', 3.6],
    ['3 + 600 mm', 'length', 'si', 3.6],
    ['1.5', 'percent', 'si', 0.015],
    ['1.5 %', 'percent', 'si', 0.015],
    ['1/550', 'percent', 'si', 1 / 550],
    ['0.3 g', 'acceleration', 'si', 0.3 * 9.80665],
    ['300 gal', 'acceleration', 'si', 3],
  ])('%s as %s (%s)', (text, quantity, system, expected) => {
    expect(Math.abs((value(text, quantity, system) as number) / expected - 1)).toBeLessThan(1e-12);
  });

  test.each<[string, number]>([
    ['+10%', 110],
    ['-5 %', 95],
    ['*1.1', 110.00000000000001],
    ['/2', 50],
    ['*1.1+5', 115.00000000000001],
    ['/2 - 10', 40],
    ['*(1+1)', 200],
  ])('%s changes the current value', (text, expected) => expect(value(text, 'ratio', 'si', 100)).toBe(expected));

  test('a number beyond all numbers has a mend of its own', () => {
    expect(readQuantity('1e400', 'force', 'si')).toEqual({
      kind: 'unreadable',
      why: '"1e400" is too large',
      mend: 'Check its exponent and its figures',
    });
  });
  test('a change without a value, a unit of another kind, words and traps are unreadable, each with a mend', () => {
    for (const [text, quantity] of [
      ['+10%', 'length'],
      ['250 kN', 'length'],
      ['3 furlong', 'length'],
      ['abc', 'length'],
      ['1..2', 'length'],
      ['1 2', 'length'],
      ["1'250", 'ratio'],
      ['(2', 'ratio'],
      ['2)', 'ratio'],
      ['1/0', 'ratio'],
      ['1e999', 'ratio'],
      ['NaN', 'ratio'],
      ['Infinity', 'ratio'],
      ['0x10', 'ratio'],
      ['2 m * 3 m', 'length'],
      ['alert(1)', 'ratio'],
      ['()', 'ratio'],
      ['1,2,3', 'ratio'],
      ['1.5 250', 'ratio'],
      ['1250 000', 'ratio'],
      ['1\u202f25', 'ratio'],
      ['1\t250', 'ratio'],
      ['0 125', 'ratio'],
      ['2 mN', 'force'],
      ['455+10%', 'ratio'],
      ["12'600", 'length'],
      ['1'.repeat(201), 'ratio'],
    ] as const) {
      const reading = readQuantity(text, quantity, 'si');
      expect(reading.kind, text).toBe('unreadable');
      if (reading.kind === 'unreadable') {
        expect(reading.why.length).toBeGreaterThan(3);
        expect(reading.mend.length).toBeGreaterThan(3);
      }
    }
    expect(readQuantity('  ', 'length', 'si')).toEqual({ kind: 'empty' });
  });

  test('a lone comma before exactly three digits has two readings', () => {
    expect(readQuantity('1,250', 'length', 'si')).toEqual({
      kind: 'ambiguous',
      readings: [
        { value: 1.25, shown: '1.25 m' },
        { value: 1250, shown: '1\u202f250 m' },
      ],
    });
    expect(readQuantity('1,250 kN', 'force', 'si').kind).toBe('ambiguous');
    expect(readQuantity('1,2500', 'length', 'si').kind).toBe('value');
  });

  test('a change is one percentage behind a sign, or a factor in front; nothing else is taken for one', () => {
    expect(value('-5+10%', 'ratio', 'si', 100)).toBe('unreadable');
    expect(value('+(5)%', 'ratio', 'si', 100)).toBe('unreadable');
    expect(value('*1.1', 'ratio', 'si', null)).toBe('unreadable');
    expect(readQuantity('+1,250%', 'ratio', 'si', 100).kind).toBe('ambiguous');
  });

  test('thousands parted by an apostrophe are refused with the mend', () => {
    const reading = readQuantity('7’250', 'weight', 'si');
    expect(reading).toEqual({
      kind: 'unreadable',
      why: 'an apostrophe parts the thousands',
      mend: 'Leave it out, or put a space there',
    });
  });

  test('feet and inches with a dash, and a drift written as a share, may mean two things', () => {
    const shown = (text: string, quantity: Quantity) => {
      const reading = readQuantity(text, quantity, 'us');
      return reading.kind === 'ambiguous' ? reading.readings.map((entry) => entry.shown) : reading.kind;
    };
    expect(shown('12 ft - 6 in', 'length')).toEqual(['11.5 ft', '12.5 ft']);
    expect(shown('2/400', 'percent')).toEqual(['0.005 %', '0.5 %']);
  });

  test('reading never throws and never gives a number that is not finite', () => {
    let cases = 0;
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), fc.stringMatching(/^[-+*/()\d., %a-zA-Z'"]{0,20}$/)),
        fc.constantFrom(...QUANTITIES),
        fc.constantFrom<System>('si', 'us'),
        (text, quantity, system) => {
          cases++;
          const reading = readQuantity(text, quantity, system, 5);
          if (reading.kind === 'value') expect(Number.isFinite(reading.value)).toBe(true);
        },
      ),
      { numRuns: 2000 },
    );
    expect(cases).toBe(2000);
    expect(readQuantity('('.repeat(5000), 'ratio', 'si').kind).toBe('unreadable');
  });
});

describe('[UNI-2] a pasted column', () => {
  test('one plain cell decides for all', () => {
    expect(readColumn(['1,250', '3,5'], 'length', 'si')).toEqual({ kind: 'values', values: [1.25, 3.5] });
    expect(readColumn(['1,250', '2,000.5'], 'length', 'si')).toEqual({ kind: 'values', values: [1250, 2000.5] });
  });
  test.each<[string, readonly string[], readonly number[]]>([
    ['a point that is the decimal sign', ['1.5', '1,250'], [1.5, 1250]],
    ['two points', ['1.250.000', '1,250'], [1250000, 1.25]],
    ['a point before the comma', ['1.250,5', '3.600'], [1250.5, 3600]],
    ['points alone are decimal signs', ['3.600', '4.200'], [3.6, 4.2]],
    ['each plain cell for itself', ['1,25', '1.5'], [1.25, 1.5]],
  ])('%s', (_, texts, values) => expect(readColumn(texts, 'ratio', 'si')).toEqual({ kind: 'values', values }));
  test('a cell that the rest leaves open is never guessed', () => {
    const reading = readColumn(['3,60', '1.250'], 'ratio', 'si');
    expect(reading.kind === 'faults' && reading.faults.map(({ row, text }) => [row, text])).toEqual([[1, '1.250']]);
    expect(readColumn(['1,25', '1.5', '1,250'], 'ratio', 'si')).toEqual({
      kind: 'undecided',
      decimal: [1.25, 1.5, 1.25],
      thousands: [1.25, 1.5, 1250],
    });
    expect(readColumn(['10 ft - 6 in', '12'], 'length', 'us').kind).toBe('faults');
    expect(readColumn(['+10%'], 'length', 'us').kind).toBe('faults');
  });
  test('whatever is pasted: as many values as cells, all finite, or faults', () => {
    fc.assert(
      fc.property(
        fc.array(fc.oneof(fc.string(), fc.stringMatching(/^\d{1,4}[.,]?\d{0,4}[.,]?\d{0,3}$/)), { maxLength: 8 }),
        fc.constantFrom(...QUANTITIES),
        (texts, quantity) => {
          const reading = readColumn(texts, quantity, 'si');
          if (reading.kind === 'faults') return reading.faults.length > 0;
          const columns = reading.kind === 'values' ? [reading.values] : [reading.decimal, reading.thousands];
          return columns.every(
            (values) => values.length === texts.length && values.every((v) => v === null || Number.isFinite(v)),
          );
        },
      ),
      { numRuns: 1000 },
    );
  });
  test('an undecided column gives both readings', () => {
    expect(readColumn(['1,250', '', '2'], 'length', 'si')).toEqual({
      kind: 'undecided',
      decimal: [1.25, null, 2],
      thousands: [1250, null, 2],
    });
  });
  test('bad cells are named, all of them', () => {
    const reading = readColumn(['1', 'x', '3', '4 kip'], 'length', 'si');
    expect(reading.kind === 'faults' && reading.faults.map((fault) => fault.row)).toEqual([1, 3]);
  });
});

describe('[UNI-4] the units of the second system', () => {
  // NIST Special Publication 811 (2008), appendix B.8, to the seven digits printed there
  test.each<[Quantity, number]>([
    ['length', 0.3048],
    ['displacement', 0.0254],
    ['force', 4448.222],
    ['stiffness', 175126.8],
    ['moment', 1355.818],
    ['energy', 112.9848],
    ['velocity', 0.0254],
    ['weight', 453.5924],
  ])('one unit of %s is %d in SI', (quantity, si) =>
    expect(Math.abs(fromDisplay(1, quantity, 'us') / si - 1)).toBeLessThan(5e-7),
  );
});

describe('[UNI-3] a printed number', () => {
  test('reads back to the same value in every quantity and system', () => {
    let cases = 0;
    fc.assert(
      fc.property(
        fc.oneof(fc.double({ min: 1e-6, max: 1e9, noNaN: true }), fc.constantFrom(1e-300, 3e-13, 2e-7, 1e21, 1.5e300)),
        fc.constantFrom(...QUANTITIES),
        fc.constantFrom<System>('si', 'us'),
        (shown, quantity, system) => {
          cases++;
          const si = fromDisplay(shown, quantity, system);
          const text = printTyped(si, quantity, system);
          const back = readQuantity(text, quantity, system);
          expect(back.kind, text).toBe('value');
          if (back.kind === 'value') expect(Math.abs(back.value / si - 1)).toBeLessThan(1e-14);
        },
      ),
      { numRuns: 1000 },
    );
    expect(cases).toBe(1000);
  });
  test('an answer reads back to what it shows, in every quantity and system', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        fc.constantFrom(...QUANTITIES),
        fc.constantFrom<System>('si', 'us'),
        fc.nat({ max: 6 }),
        (shown, quantity, system, decimals) => {
          const text = printQuantity(fromDisplay(shown, quantity, system), quantity, system, decimals);
          const back = value(text, quantity, system);
          expect(typeof back, text).toBe('number');
          expect(printQuantity(back as number, quantity, system, decimals)).toBe(text);
        },
      ),
      { numRuns: 1000 },
    );
  });
  test('whole percentages and millimetres are the doubles that the plain decimals are', () => {
    for (let i = 1; i < 1000; i++) {
      expect(value(`${i}`, 'percent')).toBe(Number(`${i}e-2`));
      expect(value(`${i} mm`, 'length')).toBe(Number(`${i}e-3`));
    }
  });
  test('what was typed is shown as typed', () => {
    for (const text of ['455', '3.6', '0.005', '7\u202f250', '31.54', '1.1']) {
      for (const quantity of QUANTITIES) {
        for (const system of ['si', 'us'] as const) {
          const si = value(text, quantity, system);
          expect(printTyped(si as number, quantity, system)).toBe(text);
        }
      }
    }
  });
  test('for the eye a converted number has ten digits, and one that was typed all of its own', () => {
    const strength = fromDisplay(8700, 'force', 'si');
    expect(printTyped(strength, 'force', 'us')).toBe('1\u202f955.83780496748');
    expect(printShort(strength, 'force', 'us')).toBe('1\u202f955.837805');
    expect(printShort(fromDisplay(1234567.89012, 'force', 'us'), 'force', 'us')).toBe('1\u202f234\u202f567.89012');
    fc.assert(
      fc.property(
        fc.oneof(fc.double({ min: 1e-6, max: 1e9, noNaN: true }), fc.constantFrom(1e-300, 3e-13, 1e21, 1.5e300)),
        fc.constantFrom(...QUANTITIES),
        (shown, quantity) => {
          const si = fromDisplay(shown, quantity, 'si');
          const back = value(printShort(si, quantity, 'us'), quantity, 'us');
          expect(Math.abs((back as number) / si - 1)).toBeLessThan(1e-9);
        },
      ),
    );
  });
  test('answers have fixed decimals, thousands from four digits, a real minus, none for nothing', () => {
    expect(printQuantity(9676e3, 'force', 'si')).toBe('9\u202f676');
    expect(printQuantity(-0.378, 'displacement', 'si')).toBe('−378');
    expect(printQuantity(-0.0001, 'length', 'si')).toBe('0.00');
    expect(printQuantity(null, 'force', 'si')).toBe('none');
    expect(printQuantity(Number.NaN, 'force', 'si')).toBe('none');
    expect(printQuantity(0.016, 'percent', 'us')).toBe('1.60');
  });
  test('a ratio is shown as 1.00 only if it is not over', () => {
    expect(printRatio(1)).toBe('1.00');
    expect(printRatio(0.9999)).toBe('1.00');
    expect(printRatio(1.0001)).toBe('1.001');
    expect(printRatio(1.0049)).toBe('1.005');
    expect(printRatio(1.07)).toBe('1.07');
  });
});
