import type { MethodChoice } from '../../core/dynamics/run.ts';
import { never } from '../../core/fault.ts';
import type { Damping } from '../../core/frame/frame.ts';
import { printQuantity } from '../../core/units/quantities.ts';

/** The damping in a few words: "Rayleigh, 5 % in modes 1 and 3". */
export function dampingWords(damping: Damping): string {
  switch (damping.kind) {
    case 'none':
      return 'no damping';
    case 'rayleigh': {
      const [first, second] = damping.ratios;
      const ratios = first === second ? percent(first) : `${percent(first)} and ${percent(second)}`;
      return `Rayleigh, ${ratios} in modes ${damping.modes[0]} and ${damping.modes[1]}`;
    }
    case 'modal': {
      const alike = damping.ratios.every((ratio) => ratio === damping.ratios[0]);
      return alike
        ? `modal, ${percent(damping.ratios[0] ?? 0)} in every mode`
        : `modal, ${damping.ratios.map(percent).join(', ')}`;
    }
    case 'stiffness-proportional':
      return `stiffness-proportional, ${percent(damping.ratio)} in mode ${damping.mode}`;
    default:
      return never(damping);
  }
}

/** The method in a few words: "Newmark, β ¼, γ ½". */
export function methodWords(method: MethodChoice): string {
  switch (method.kind) {
    case 'newmark':
      return `Newmark, β ${part(method.beta)}, γ ${part(method.gamma)}`;
    case 'generalized-alpha':
      return `generalized-α, spectral radius ${method.spectralRadius}`;
    case 'hht':
      return `HHT-α, α ${String(method.alpha).replace('-', '−')}`;
    case 'central-difference':
      return 'central difference';
    default:
      return never(method);
  }
}

function percent(ratio: number): string {
  const text = printQuantity(ratio, 'percent', 'si', 2).replace(/\.?0+$/, '');
  return `${text} %`;
}

const PARTS: readonly (readonly [number, string])[] = [
  [1 / 4, '¼'],
  [1 / 2, '½'],
  [3 / 4, '¾'],
  [1 / 6, '1/6'],
  [1 / 3, '1/3'],
];

function part(value: number): string {
  return PARTS.find(([known]) => Math.abs(known - value) < 1e-9)?.[1] ?? String(Number(value.toPrecision(6)));
}
