import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { type CsvOptions, csvOf, PLAIN_CSV } from '../../../src/core/report/csv.ts';
import type { Column, Table } from '../../../src/core/report/table.ts';
import { tablesOf } from '../../../src/core/report/tables.ts';
import { fromDisplay } from '../../../src/core/units/quantities.ts';
import { exampleSource } from './example.ts';

function tableOf(...columns: Partial<Column>[]): Table {
  return {
    id: 'trial',
    title: 'Trial',
    columns: columns.map((column) => ({ key: 'key', name: 'Name', quantity: 'text', values: [], ...column })),
  };
}

/** A plain reader of RFC 4180 text, written from its grammar: it knows nothing of how ours is written. */
function readCsv(text: string, separator: string): string[][] {
  const rows: string[][] = [];
  let row: string[] = [];
  let at = 0;
  while (at < text.length) {
    let cell = '';
    if (text[at] === '"') {
      at++;
      while (text[at] !== '"' || text[at + 1] === '"') {
        if (at >= text.length) throw new Error('a quote is not closed');
        if (text[at] === '"') at++;
        cell += text[at++];
      }
      at++;
    } else {
      while (at < text.length && text[at] !== separator && !text.startsWith('\r\n', at)) cell += text[at++];
    }
    row.push(cell);
    if (text[at] === separator) {
      at++;
    } else if (text.startsWith('\r\n', at)) {
      at += 2;
      rows.push(row);
      row = [];
    } else {
      throw new Error(`neither separator nor line end at ${at}`);
    }
  }
  return rows;
}

const COMMA: CsvOptions = { separator: ',', decimal: '.', system: 'base' };
const SEMICOLON: CsvOptions = { separator: ';', decimal: ',', system: 'base' };

// Source of the form: RFC 4180, section 2, rules 1 to 7.
describe('[CSV-1] the text is that of RFC 4180', () => {
  test('rows end in CRLF, cells are quoted only where they need it', () => {
    const table = tableOf({ name: 'Name, first', values: ['plain', 'a "b"', 'two\r\nlines', null] });
    expect(csvOf(table, COMMA)).toBe('"Name, first"\r\nplain\r\n"a ""b"""\r\n"two\r\nlines"\r\n\r\n');
  });

  test('any words come back as they were, with an apostrophe before what would be run', () => {
    const words = fc.array(fc.tuple(fc.string({ unit: 'binary' }), fc.string()), { minLength: 1 });
    const harmless = (text: string) =>
      [...'=+-@\t\r\n＝＋－＠'].some((start) => text.startsWith(start)) ? `'${text}` : text;
    fc.assert(
      fc.property(words, fc.constantFrom(COMMA, SEMICOLON), (rows, options) => {
        const table = tableOf({ values: rows.map(([a]) => a) }, { key: 'b', values: rows.map(([, b]) => b) });
        const read = readCsv(csvOf(table, options), options.separator).slice(1);
        expect(read).toEqual(rows.map((row) => row.map(harmless)));
      }),
      { examples: [[[['', "'="]], COMMA]] },
    );
  });
});

describe('[CSV-2] no cell is run as a formula', () => {
  test.each(['=1+1', '+1', '-1', '@sum', '\tx', '\rx', '=HYPERLINK("x")', '＝1+1'])('%j gets an apostrophe', (text) => {
    const [[head], [cell]] = readCsv(csvOf(tableOf({ name: text, values: [text] }), COMMA), ',');
    expect(head).toBe(`'${text}`);
    expect(cell).toBe(`'${text}`);
  });

  test('numbers are left alone, negative ones too', () => {
    expect(csvOf(tableOf({ quantity: 'force', values: [-12.5, 3] }), COMMA)).toBe('Name [N]\r\n-12.5\r\n3\r\n');
  });
});

describe('[CSV-3] numbers keep their precision', () => {
  test('coherent SI reads back to the same number', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (value) => {
        const [, [cell]] = readCsv(csvOf(tableOf({ quantity: 'stiffness', values: [value] }), PLAIN_CSV), ',');
        expect(Number(cell)).toBe(value === 0 ? 0 : value);
      }),
    );
  });

  test.each(['si', 'us'] as const)('display units (%s) read back within 1e-11', (system) => {
    fc.assert(
      fc.property(fc.double({ min: 1e-6, max: 1e12, noNaN: true }), (value) => {
        const text = csvOf(tableOf({ quantity: 'force', values: [value] }), { ...SEMICOLON, system });
        const [, [cell]] = readCsv(text, ';');
        expect(cell).not.toContain('.');
        const back = fromDisplay(Number(cell.replace(',', '.')), 'force', system);
        expect(Math.abs(back - value)).toBeLessThanOrEqual(1e-11 * value);
      }),
    );
  });

  test('none and what is not finite are empty', () => {
    expect(csvOf(tableOf({ quantity: 'time', values: [null, Number.NaN, Number.POSITIVE_INFINITY] }), COMMA)).toBe(
      'Name [s]\r\n\r\n\r\n\r\n',
    );
  });
});

test('[CSV-4] every head of a number carries its unit, in each system', () => {
  for (const system of ['base', 'si', 'us'] as const) {
    for (const table of tablesOf(exampleSource())) {
      const [heads] = readCsv(csvOf(table, { ...COMMA, system }), ',');
      table.columns.forEach(({ quantity }, c) => {
        if (quantity === 'text' || quantity === 'count') expect(heads[c]).not.toContain('[');
        else expect(heads[c]).toMatch(/ \[\S.*\]$/);
      });
    }
  }
  const heads = (system: CsvOptions['system']) =>
    csvOf(tableOf({ name: 'Weight', quantity: 'weight', values: [1000] }), { ...COMMA, system }).split('\r\n');
  expect(heads('base')).toEqual(['Mass [kg]', '1000', '']);
  expect(heads('si')).toEqual(['Weight [kN]', '9.80665', '']);
});
