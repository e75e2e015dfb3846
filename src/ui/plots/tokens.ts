import { useSyncExternalStore } from 'react';

/** The colours and letters of the page as they stand now: plotly takes no custom properties. */
export interface Tokens {
  readonly paper: string;
  readonly sheet: string;
  readonly ink: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly control: string;
  readonly rule: string;
  readonly hair: string;
  readonly accent: string;
  readonly signal: string;
  readonly suite: string;
  readonly shade: string;
  readonly e1: string;
  readonly e2: string;
  readonly e3: string;
  readonly e4: string;
  readonly sans: string;
}

let known: Tokens | null = null;

function read(): Tokens {
  const style = getComputedStyle(document.documentElement);
  const of = (name: string) => style.getPropertyValue(`--${name}`).trim();
  return {
    paper: of('paper'),
    sheet: of('sheet'),
    ink: of('ink'),
    ink2: of('ink2'),
    ink3: of('ink3'),
    control: of('control'),
    rule: of('rule'),
    hair: of('hair'),
    accent: of('accent'),
    signal: of('signal'),
    suite: of('suite'),
    shade: of('shade'),
    e1: of('e1'),
    e2: of('e2'),
    e3: of('e3'),
    e4: of('e4'),
    sans: of('sans'),
  };
}

function current(): Tokens {
  known ??= read();
  return known;
}

function subscribe(heard: () => void): () => void {
  const changed = () => {
    known = null;
    heard();
  };
  const dark = window.matchMedia('(prefers-color-scheme: dark)');
  const observer = new MutationObserver(changed);
  observer.observe(document.documentElement, { attributeFilter: ['data-theme'] });
  dark.addEventListener('change', changed);
  changed();
  return () => {
    observer.disconnect();
    dark.removeEventListener('change', changed);
  };
}

/** Read again on every change of theme. */
export function useTokens(): Tokens {
  return useSyncExternalStore(subscribe, current);
}
