import type { PlotData } from 'plotly.js-basic-dist-min';
import type { Tokens } from '../plots/tokens.ts';
import type { EnergyPart } from './panelContent.ts';

/** Names of the energies, as the panels and their tables say them. */
export const ENERGY_NAMES: Readonly<Record<EnergyPart, string>> = {
  hysteretic: 'hysteretic',
  damping: 'viscous damping',
  dampers: 'dampers',
  strain: 'strain',
  kinetic: 'kinetic',
};

/** Colour token of each layer. Dampers take the tone of viscous damping, hatched: they are viscous too. */
export const ENERGY_FILLS = { hysteretic: 'e1', damping: 'e2', dampers: 'e2', strain: 'e3', kinetic: 'e4' } as const;

export function isHatched(part: EnergyPart): boolean {
  return part === 'dampers';
}

interface Hatch {
  readonly shape: '/';
  readonly fgcolor: string;
  readonly bgcolor: string;
  readonly size: number;
  readonly solidity: number;
}

/** The hatch of a part as the plot library takes it; null for a plain one. */
export function hatchOf(part: EnergyPart, tokens: Tokens): Hatch | null {
  if (!isHatched(part)) return null;
  return { shape: '/', fgcolor: tokens.paper, bgcolor: tokens[ENERGY_FILLS[part]], size: 6, solidity: 0.35 };
}

/** How a stacked layer is filled. Its types lag behind the library, which knows hatches of areas. */
export function layerFill(part: EnergyPart, tokens: Tokens): Partial<PlotData> {
  const fillpattern = hatchOf(part, tokens);
  return { fillcolor: tokens[ENERGY_FILLS[part]], ...(fillpattern === null ? {} : { fillpattern }) };
}
