/** One axis as plotly lays it out; `d2p` and `p2d` turn data into pixels from the axis' beginning and back. */
export interface AxisLayout {
  readonly range: readonly [number, number];
  readonly _offset: number;
  readonly _length: number;
  d2p(value: number): number;
  p2d(pixel: number): number;
}

/** The element that plotly draws into. */
export interface PlotElement extends HTMLElement {
  readonly _fullLayout: { readonly xaxis: AxisLayout; readonly yaxis: AxisLayout };
  on(event: string, heard: (data: never) => void): void;
}

/** What plotly says when a shape was drawn. */
export interface Drawn {
  readonly lassoPoints?: { readonly x: readonly number[]; readonly y: readonly number[] };
  readonly range?: { readonly x: readonly [number, number]; readonly y: readonly [number, number] };
}

/** What the window uses of plotly.js' core. */
export interface PlotlyCore {
  react(element: HTMLElement, data: readonly object[], layout: object, config: object): Promise<PlotElement>;
  relayout(element: HTMLElement, update: object): Promise<PlotElement>;
  purge(element: HTMLElement): void;
  Plots: { resize(element: HTMLElement): void };
}
