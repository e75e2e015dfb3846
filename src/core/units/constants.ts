/** Standard acceleration of gravity [m/s2]. Source: 3rd CGPM (1901); binding for the project file. */
export const STANDARD_GRAVITY = 9.80665;
