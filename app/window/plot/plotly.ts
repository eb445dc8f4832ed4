import core from 'plotly.js/lib/core';
import type { Drawn, PlotElement, PlotlyCore } from './types';

const Plotly = core as PlotlyCore;

// plotly lays out axes, zoom and the drawing of shapes; marks and cells are drawn by us, because redrawing its own
// marks takes tens of milliseconds a plate, and its heat map asks for inline styles.

const CONFIG = {
  displaylogo: false,
  displayModeBar: true,
  modeBarButtonsToRemove: ['toImage', 'autoScale2d'],
  modeBarButtonsToAdd: ['lasso2d', 'select2d'],
  showSendToCloud: false,
  plotlyServerURL: '',
  responsive: false,
  scrollZoom: true,
  doubleClick: 'reset',
} as const;

/** What a plate looks like, apart from its marks. */
export interface PlateLook {
  readonly xTitle: string;
  readonly yTitle: string;
  readonly xRange: readonly [number, number];
  readonly yRange: readonly [number, number];
  readonly ink: string;
  readonly rule: string;
  readonly font: string;
}

/** Lays out a plate, or lays it out anew. */
export function layPlate(element: HTMLElement, look: PlateLook): Promise<PlotElement> {
  const axis = (title: string, range: readonly [number, number]): object => ({
    title: { text: title, standoff: 4 },
    range: [...range],
    color: look.ink,
    gridcolor: look.rule,
    zerolinecolor: look.rule,
    linecolor: look.ink,
    showline: true,
    mirror: true,
    ticks: 'inside',
    ticklen: 4,
    tickcolor: look.ink,
  });
  // Two invisible corners: without any trace plotly draws no axes.
  const corners = {
    type: 'scatter',
    mode: 'markers',
    x: [look.xRange[0]],
    y: [look.yRange[0]],
    opacity: 0,
    hoverinfo: 'skip',
  };
  const layout = {
    xaxis: axis(look.xTitle, look.xRange),
    yaxis: axis(look.yTitle, look.yRange),
    margin: { l: 52, r: 10, t: 26, b: 38 },
    font: { family: look.font, size: 11, color: look.ink },
    paper_bgcolor: 'transparent',
    plot_bgcolor: 'transparent',
    modebar: { bgcolor: 'transparent', color: look.ink, activecolor: look.ink, orientation: 'h' },
    dragmode: 'lasso',
    hovermode: false,
    showlegend: false,
    uirevision: `${look.xTitle} ${look.yTitle}`,
    newselection: { line: { color: look.ink, width: 1.2, dash: 'dot' } },
  };
  return Plotly.react(element, [corners], layout, CONFIG);
}

/** Calls back when a lasso or box was drawn on the plate, with its corners in data coordinates. */
export function onShape(element: PlotElement, heard: (polygon: [number, number][]) => void): void {
  element.on('plotly_selected', (drawn: Drawn | undefined) => {
    const polygon = polygonOf(drawn);
    if (polygon.length >= 3) heard(polygon);
  });
}

/** Calls back when axes moved. */
export function onMoved(element: PlotElement, heard: () => void): void {
  for (const event of ['plotly_relayout', 'plotly_relayouting', 'plotly_afterplot']) element.on(event, heard);
}

/** Calls back with what the axes show, once they came to rest. */
export function onZoomed(
  element: PlotElement,
  heard: (range: { x: readonly [number, number]; y: readonly [number, number] }) => void,
): void {
  element.on('plotly_relayout', () => {
    const { xaxis, yaxis } = element._fullLayout;
    heard({ x: [...xaxis.range], y: [...yaxis.range] });
  });
}

/** Takes a drawn shape off the plate. */
export function clearShape(element: HTMLElement): void {
  void Plotly.relayout(element, { selections: [] });
}

/** Fits the plate to its element. */
export function resizePlate(element: HTMLElement): void {
  Plotly.Plots.resize(element);
}

/** Lets go of a plate. */
export function dropPlate(element: HTMLElement): void {
  Plotly.purge(element);
}

function polygonOf(drawn: Drawn | undefined): [number, number][] {
  if (drawn?.lassoPoints) return drawn.lassoPoints.x.map((x, at) => [x, drawn.lassoPoints!.y[at]!]);
  if (!drawn?.range) return [];
  const { x, y } = drawn.range;
  return [
    [x[0], y[0]],
    [x[1], y[0]],
    [x[1], y[1]],
    [x[0], y[1]],
  ];
}
