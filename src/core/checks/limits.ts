/** The allowable storey drift, as the project file holds it. */
export interface Limits {
  /** Allowable storey drift ratio, > 0. */
  readonly drift: number;
  /** Statistic of the suite that is compared; absent: mean from 7 motions on, else max. */
  readonly measure?: 'mean' | 'median' | 'max';
  /** On the computed drift before it is compared; default 1. */
  readonly factor?: number;
  /** Displacement that an isolator may reach [m], > 0; absent: not compared. */
  readonly isolator?: number;
  /** The clause, the earthquake level and which drift it limits, in words. */
  readonly source: string;
}
