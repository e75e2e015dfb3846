import type { Dash, Layout, LayoutAxis } from 'plotly.js-basic-dist-min';
import type { Ticks } from './ticks.ts';
import type { Tokens } from './tokens.ts';

/** Room around the axes of every plot [px]. */
export const MARGIN = { l: 44, r: 8, t: 6, b: 24 } as const;

/** The dashes of a limit: the library takes lengths as well, which its types do not say. */
export const LIMIT_DASHES = '6px,3px' as Dash;

export interface Size {
  readonly width: number;
  readonly height: number;
}

/** What all plots have in common: no title, no legend, no axis line; the head of the panel says what it is. */
export function baseLayout(
  tokens: Tokens,
  { width, height }: Size,
  margin: Partial<Layout['margin']> = {},
): Partial<Layout> {
  return {
    width,
    height,
    margin: { ...MARGIN, pad: 0, ...margin },
    paper_bgcolor: 'rgba(0,0,0,0)',
    plot_bgcolor: 'rgba(0,0,0,0)',
    font: { family: tokens.sans, size: 11, color: tokens.ink3 },
    showlegend: false,
    dragmode: false,
    hovermode: 'closest',
    separators: '.\u202f',
    hoverlabel: {
      bgcolor: tokens.sheet,
      bordercolor: tokens.control,
      font: { family: tokens.sans, size: 12, color: tokens.ink },
      align: 'left',
    },
  };
}

/** A linear axis over a range, with its numbers already in words. */
export function axis(
  tokens: Tokens,
  range: readonly [number, number],
  ticks: Ticks,
  print: ((value: number) => string) | null,
): Partial<LayoutAxis> {
  return {
    range: [...range],
    fixedrange: true,
    tickmode: 'array',
    tickvals: [...ticks.at],
    ...(print === null ? { showticklabels: false } : { ticktext: ticks.at.map(print) }),
    ticks: '',
    ticklabeloverflow: 'allow',
    showline: false,
    gridcolor: tokens.hair,
    gridwidth: 1,
    zeroline: true,
    zerolinecolor: tokens.rule,
    zerolinewidth: 1,
    exponentformat: 'none',
  };
}
