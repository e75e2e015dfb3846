import { ENERGY_FILLS, isHatched } from './energyLook.ts';
import type { EnergyPart } from './panelContent.ts';

/** The fill of an energy in a key. */
export function EnergyKey({ part }: { readonly part: EnergyPart }) {
  const tone = `var(--${ENERGY_FILLS[part]})`;
  const background = isHatched(part)
    ? `repeating-linear-gradient(-45deg, ${tone} 0 2.5px, var(--paper) 2.5px 4px)`
    : tone;
  return <i className="energy-key" style={{ background }} />;
}
