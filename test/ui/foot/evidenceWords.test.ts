import { describe, expect, it } from 'vitest';
import { percent, percentBeside, runsWords, tookWords } from '../../../src/ui/foot/evidenceWords.ts';

describe('the words of the evidence line', () => {
  it('print a share with two figures, and beside an aim never as the aim itself', () => {
    expect(percent(0.0124)).toBe('1.2 %');
    expect(percent(0.0000001)).toBe('under 0.001 %');
    expect(percentBeside(0.01, 0.0124)).toBe('1.2 %');
    expect(percentBeside(0.01, 0.01032)).toBe('1.03 %');
    expect(percentBeside(0.01, 0.00998)).toBe('0.998 %');
    expect(percentBeside(0.01, 0.01)).toBe('1.0 %');
  });

  it('count the runs, and those that ended early', () => {
    expect(runsWords([true, true, true])).toBe('3 runs');
    expect(runsWords([true, false, true])).toBe('3 runs, 1 ended early,');
    expect(runsWords([false, false])).toBe('2 runs, all ended early,');
    expect(runsWords([false])).toBe('1 run ended early,');
  });

  it('print no time of nothing', () => {
    expect(tookWords(0)).toBe('under 0.01 s');
    expect(tookWords(214)).toBe('0.21 s');
  });
});
