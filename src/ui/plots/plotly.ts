import type * as Plotly from 'plotly.js-basic-dist-min';

type PlotLibrary = typeof Plotly;

/** One plot as it shall stand: its lines, its axes, its size. */
export interface PlotSpec {
  readonly data: readonly Partial<Plotly.PlotData>[];
  readonly layout: Partial<Plotly.Layout>;
  /** Nothing in it answers to the pointer. */
  readonly still?: boolean;
}

let loading: Promise<PlotLibrary> | null = null;

/** The plot library, fetched when it is first asked for; a failed fetch is tried again at the next call. */
function plotLibrary(): Promise<PlotLibrary> {
  loading ??= import('plotly.js-basic-dist-min').then(async (module) => {
    // Reading the library in is a task of its own: the first plot waits for the next one.
    await new Promise((resolve) => setTimeout(resolve, 0));
    return module.default as PlotLibrary;
  });
  loading.catch(() => {
    loading = null;
  });
  return loading;
}

export async function drawPlot(element: HTMLElement, { data, layout, still = false }: PlotSpec): Promise<void> {
  const library = await plotLibrary();
  if (!element.isConnected) return;
  await library.react(element, [...data], layout, {
    displayModeBar: false,
    displaylogo: false,
    staticPlot: still,
    scrollZoom: false,
    doubleClick: false,
    showTips: false,
    // The library could upload a plot for editing elsewhere: both doors are closed.
    showSendToCloud: false,
    plotlyServerURL: '',
  });
}

export function clearPlot(element: HTMLElement): void {
  loading?.then((library) => library.purge(element)).catch(() => {});
}
