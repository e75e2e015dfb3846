import { fromDisplay, printQuantity, type Quantity, type System, toDisplay, unitOf } from './quantities.ts';

/** How the numbers along one axis are shown: all in one unit. */
export interface AxisUnit {
  readonly unit: string;
  /** A value in SI as it stands on the axis. */
  readonly onAxis: (value: number) => number;
  /** A value in SI in words, at so many decimals. */
  readonly print: (value: number, decimals: number) => string;
  /** A value that stands on the axis already. */
  readonly printTick: (onAxis: number, decimals: number) => string;
  /** Decimals of an answer read from this axis. */
  readonly decimals: number;
}

interface Larger {
  readonly unit: string;
  /** How many of the quantity's own shown units make one. */
  readonly times: number;
}

/** From so many shown units on, an axis takes the larger one: four digits and a sign still fit beside it. */
const FROM = 5000;

/** Thousandfold in SI; a kip foot is twelve kip inches. */
const LARGER: Readonly<Partial<Record<Quantity, Readonly<Partial<Record<System, Larger>>>>>> = {
  force: { si: { unit: 'MN', times: 1000 } },
  energy: { si: { unit: 'MJ', times: 1000 }, us: { unit: 'kip ft', times: 12 } },
};

/** Decimals of an answer in the quantity's own unit where an axis says one more than the sheet does. */
const FINER: Readonly<Partial<Record<Quantity, number>>> = { percent: 2, acceleration: 2 };

/** The unit of an axis whose largest value is given [SI]. */
export function axisUnitOf(quantity: Quantity, system: System, largest: number): AxisUnit {
  const larger = LARGER[quantity]?.[system];
  const times = larger && toDisplay(Math.abs(largest), quantity, system) >= FROM ? larger.times : 1;
  const own = (value: number) => fromDisplay(toDisplay(value, quantity, system) / times, quantity, system);
  const print = (value: number, decimals: number) => printQuantity(own(value), quantity, system, decimals);
  return {
    unit: larger && times > 1 ? larger.unit : unitOf(quantity, system),
    onAxis: (value) => toDisplay(value, quantity, system) / times,
    print,
    printTick: (onAxis, decimals) => printQuantity(fromDisplay(onAxis, quantity, system), quantity, system, decimals),
    decimals: times > 1 ? 2 : (FINER[quantity] ?? (system === 'us' && quantity !== 'force' ? 2 : 0)),
  };
}
