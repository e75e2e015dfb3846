import { useMemo, useRef } from 'react';
import { dampingPlot } from '../plots/dampingPlot.ts';
import { dampingSentence } from '../plots/dampingWords.ts';
import { Plot } from '../plots/Plot.tsx';
import { useTokens } from '../plots/tokens.ts';
import { useDamping } from '../plots/useDamping.ts';
import { useSize } from '../plots/useSize.ts';

/** Damping ratio against period, small: how the ratio runs between the modes of this frame. */
export function DampingPicture() {
  const place = useRef<HTMLDivElement>(null);
  const size = useSize(place);
  const tokens = useTokens();
  const picture = useDamping();
  const spec = useMemo(
    () => (picture === null || size === null ? null : () => dampingPlot(picture, size, tokens)),
    [picture, size, tokens],
  );
  return (
    <figure className="damping-picture">
      <figcaption className="quiet small">
        Ratio in % of critical against period in s; dots: modes of this frame; dotted: asked for
        {picture?.damping.kind !== 'modal' && '; shaded: half to twice'}
      </figcaption>
      <div ref={place} className="damping-plot">
        {spec !== null && picture !== null && <Plot spec={spec} label={dampingSentence(picture)} />}
      </div>
    </figure>
  );
}
