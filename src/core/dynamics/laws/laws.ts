import type { Law } from '../../frame/frame.ts';
import { FIELD } from '../record.ts';
import * as bilinear from './bilinear.ts';
import * as boucWen from './boucWen.ts';
import * as elastic from './elastic.ts';
import * as flag from './flag.ts';
import type { LawBehaviour } from './law.ts';
import * as peakOriented from './peakOriented.ts';

const { LAW, K, K_YIELD, STRENGTH, LAW_P, LAW_Q, LAW_R } = FIELD;
const { LAW_A, LAW_B, LAW_C, LAW_D, DRIFT, FORCE, WORK } = FIELD;

/** Numbers of the kinds, as they stand in a record's LAW; each is its law's place in LAWS. */
export const ELASTIC = 0;
export const BILINEAR = 1;
const PEAK_ORIENTED = 2;
export const BOUC_WEN = 3;
export const FLAG = 4;

const NUMBERS: { readonly [kind in Law['kind']]: number } = {
  elastic: ELASTIC,
  bilinear: BILINEAR,
  'peak-oriented': PEAK_ORIENTED,
  'bouc-wen': BOUC_WEN,
  flag: FLAG,
};

/** The laws by number. */
export const LAWS: readonly LawBehaviour[] = [
  elastic.elastic,
  bilinear.bilinear,
  peakOriented.peakOriented,
  boucWen.boucWen,
  flag.flag,
];

/** The number of a law's kind. */
export function numberOf(law: Law): number {
  return NUMBERS[law.kind];
}

/**
 * Writes a law into the record at `at`, in its virgin state: LAW, K, K_YIELD, STRENGTH (Infinity for elastic), parameters, zero
 * drift, force and work, and the law's own state.
 *
 * @param stiffness initial stiffness [N/m], > 0
 */
export function setLaw(w: Float64Array, at: number, law: Law, stiffness: number): void {
  const number = numberOf(law);
  w[at + LAW] = number;
  w[at + K] = stiffness;
  w[at + K_YIELD] = law.kind === 'elastic' ? stiffness : law.hardening * stiffness;
  w[at + STRENGTH] = law.kind === 'elastic' ? Number.POSITIVE_INFINITY : law.strength;
  w[at + LAW_P] = law.kind === 'bouc-wen' ? law.exponent : law.kind === 'flag' ? law.ratio : 0;
  w[at + LAW_Q] = law.kind === 'bouc-wen' ? law.beta : 0;
  w[at + LAW_R] = law.kind === 'bouc-wen' ? law.gamma : 0;
  for (const place of [DRIFT, FORCE, WORK, LAW_A, LAW_B, LAW_C, LAW_D]) w[at + place] = 0;
  LAWS[number].begin(w, at);
}

/** The trial of the record's law. A switch of direct calls: through the table each call would be looked up anew. */
export function trialOf(w: Float64Array, at: number): void {
  switch (w[at + LAW]) {
    case ELASTIC:
      elastic.trial(w, at);
      break;
    case BILINEAR:
      bilinear.trial(w, at);
      break;
    case PEAK_ORIENTED:
      peakOriented.trial(w, at);
      break;
    case BOUC_WEN:
      boucWen.trial(w, at);
      break;
    case FLAG:
      flag.trial(w, at);
      break;
  }
}

/** The commit of the record's law. */
export function commitOf(w: Float64Array, at: number): void {
  switch (w[at + LAW]) {
    case ELASTIC:
      elastic.commit(w, at);
      break;
    case BILINEAR:
      bilinear.commit(w, at);
      break;
    case PEAK_ORIENTED:
      peakOriented.commit(w, at);
      break;
    case BOUC_WEN:
      boucWen.commit(w, at);
      break;
    case FLAG:
      flag.commit(w, at);
      break;
  }
}
