/**
 * What the building is, as plain data. Storeys stand from the ground up: storeys[0] stands on the ground. SI throughout.
 * Names and meaning are those of the project file.
 */
export type Law =
  | { readonly kind: 'elastic' }
  | { readonly kind: 'bilinear'; readonly strength: number; readonly hardening: number }
  | { readonly kind: 'peak-oriented'; readonly strength: number; readonly hardening: number }
  | {
      readonly kind: 'bouc-wen';
      readonly strength: number;
      readonly hardening: number;
      readonly exponent: number;
      readonly beta: number;
      readonly gamma: number;
    }
  | { readonly kind: 'flag'; readonly strength: number; readonly hardening: number; readonly ratio: number };

/** Storey damper F = coefficient |v|^exponent sgn(v), v the storey drift velocity [N, m/s]. */
export interface Damper {
  readonly coefficient: number;
  readonly exponent: number;
}

export interface Storey {
  readonly name: string;
  /** Floor to floor [m], > 0. */
  readonly height: number;
  /** Lumped at the floor on top of this storey [kg], > 0. */
  readonly mass: number;
  /** Initial lateral stiffness [N/m], > 0. */
  readonly stiffness: number;
  readonly law: Law;
  /** Gravity load at this floor for P-Delta [N]; mass x 9.80665 where absent. */
  readonly gravity?: number;
  readonly damper?: Damper;
  readonly role?: 'storey' | 'isolator';
}

/** Modes are numbered from 1; ratios are fractions of critical. */
export type Damping =
  | { readonly kind: 'none' }
  | {
      readonly kind: 'rayleigh';
      readonly modes: readonly [number, number];
      readonly ratios: readonly [number, number];
      readonly stiffness?: 'initial' | 'tangent';
    }
  | { readonly kind: 'modal'; readonly ratios: readonly number[] }
  | { readonly kind: 'stiffness-proportional'; readonly mode: number; readonly ratio: number };

export interface Frame {
  readonly storeys: readonly Storey[];
  readonly damping: Damping;
  readonly pDelta: boolean;
}
