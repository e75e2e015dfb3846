import { backboneTo, type Loop } from './loop.ts';
import { type LoopAxes, reachOf } from './loopAxes.ts';
import type { PlotSpec } from './plotly.ts';
import { axis, baseLayout, LIMIT_DASHES } from './template.ts';
import { thinnedPath } from './thin.ts';
import { ticksBetween, tickWords } from './ticks.ts';
import type { Tokens } from './tokens.ts';

/** The whole loop in grey, with the limits and, where asked for, the backbone of the law: what the cursor has passed is drawn over it. */
export function loopPlot(loop: Loop, axes: LoopAxes, tokens: Tokens, withBackbone: boolean): PlotSpec {
  const { drift, force, endX, endY, size } = axes;
  const kept = thinnedPath(loop.drift, loop.force, reachOf(axes));
  const along = ticksBetween(-endX, endX, Math.max(6, size.width / 56));
  const upward = ticksBetween(-endY, endY, Math.max(6, size.height / 56));
  const limit = drift.onAxis(loop.limit);
  // The law's own first loading says nothing of a force that the damper has a part in.
  const backbone = withBackbone && loop.which === 'law' ? backboneTo(loop.storey, endX / drift.onAxis(1)) : null;
  return {
    still: true,
    data: [
      ...(backbone === null
        ? []
        : [
            {
              type: 'scatter' as const,
              mode: 'lines' as const,
              hoverinfo: 'skip' as const,
              x: backbone.drift.map(drift.onAxis),
              y: backbone.force.map(force.onAxis),
              line: { color: tokens.ink3, width: 1.2, dash: 'dot' as const },
            },
          ]),
      {
        type: 'scatter',
        mode: 'lines',
        hoverinfo: 'skip',
        x: Float64Array.from(kept, (i) => drift.onAxis(loop.drift[i])),
        y: Float64Array.from(kept, (i) => force.onAxis(loop.force[i])),
        line: { color: tokens.suite, width: 0.9, simplify: false },
      },
    ],
    layout: {
      ...baseLayout(tokens, size),
      xaxis: axis(tokens, [-endX, endX], along, tickWords(drift, along)),
      yaxis: axis(tokens, [-endY, endY], upward, tickWords(force, upward)),
      shapes:
        limit < endX
          ? [limit, -limit].map((at) => ({
              type: 'line',
              yref: 'paper',
              y0: 0,
              y1: 1,
              x0: at,
              x1: at,
              line: { color: tokens.signal, width: 1, dash: LIMIT_DASHES },
            }))
          : [],
      annotations:
        limit < endX
          ? [
              {
                x: limit,
                xanchor: 'right',
                xshift: -4,
                yref: 'paper',
                y: 0,
                yanchor: 'bottom',
                text: 'limit',
                showarrow: false,
                font: { family: tokens.sans, size: 11, color: tokens.signal },
              },
            ]
          : [],
    },
  };
}
