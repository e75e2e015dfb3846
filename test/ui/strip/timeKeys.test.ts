import { beforeEach, describe, expect, it } from 'vitest';
import { sessionStore, setSession } from '../../../src/state/session.ts';
import { advanced } from '../../../src/ui/strip/play.ts';
import { timeKey } from '../../../src/ui/strip/timeKeys.ts';

const context = { end: 35, step: 0.005, peak: 3.81 };
const press = (key: string, shiftKey = false) => timeKey({ key, shiftKey }, context);
const now = () => sessionStore.getState();

beforeEach(() => setSession({ time: 1, playing: false, range: null }));

describe('keys of the time cursor', () => {
  it('go one step or ten, to the ends, to the peak', () => {
    press('ArrowRight');
    expect(now().time).toBeCloseTo(1.005, 12);
    press('ArrowLeft', true);
    expect(now().time).toBeCloseTo(0.955, 12);
    press('End');
    expect(now().time).toBe(35);
    press('ArrowRight');
    expect(now().time).toBe(35);
    press('Home');
    press('ArrowLeft');
    expect(now().time).toBe(0);
    press('p');
    expect(now().time).toBe(3.81);
  });

  it('land on what was computed, from wherever the cursor was dragged to', () => {
    setSession({ time: 1.0021 });
    press('ArrowRight');
    expect(now().time).toBeCloseTo(1.005, 12);
  });

  it('play, from the start where the cursor stands at the end, and stop when the cursor is moved', () => {
    press('End');
    press(' ');
    expect(now()).toMatchObject({ playing: true, time: 0 });
    press('ArrowRight');
    expect(now().playing).toBe(false);
  });

  it('zoom about the cursor and show all again', () => {
    press('+');
    expect(now().range).toEqual([0.5, 18]);
    press('-');
    expect(now().range).toBeNull();
    press('+');
    press('0');
    expect(now().range).toBeNull();
    expect(press('x')).toBe(false);
  });

  it('without a run there is no peak to go to', () => {
    expect(timeKey({ key: 'P', shiftKey: false }, { ...context, peak: null })).toBe(true);
    expect(now().time).toBe(1);
  });
});

describe('a playing cursor', () => {
  it('goes in real time', () => {
    expect(advanced(2, 0.016, false)).toEqual({ time: 2.016, left: 0 });
  });

  it('steps four times a second where motion is to be reduced', () => {
    expect(advanced(2, 0.2, true)).toEqual({ time: 2, left: 0.2 });
    const next = advanced(2, 0.55, true);
    expect(next.time).toBe(2.5);
    expect(next.left).toBeCloseTo(0.05, 12);
  });
});
