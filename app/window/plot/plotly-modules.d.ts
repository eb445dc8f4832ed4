// The parts of plotly.js that the window uses; the package's own types describe only the full bundle.
declare module 'plotly.js/lib/core' {
  const core: unknown;
  export default core;
}
