// Imports run one way; see "The house" in DEVELOPERS.md.
const layers = {
  table: [],
  formats: ['table'],
  frame: ['table'],
  roster: ['table', 'formats', 'frame'],
  quantities: ['table', 'frame'],
  cuts: ['table', 'frame', 'quantities'],
  assess: ['table', 'frame', 'quantities', 'cuts'],
  mock: ['table', 'formats', 'frame', 'roster', 'quantities', 'cuts', 'edition'],
  edition: ['table', 'formats', 'frame', 'roster', 'quantities', 'cuts', 'assess'],
};

const layerRules = Object.entries(layers).map(([layer, below]) => ({
  name: `core-${layer}`,
  severity: 'error',
  comment: `core/${layer} may import only ${['itself', ...below].join(', ')}`,
  from: { path: `^core/${layer}/` },
  to: { path: '^core/', pathNot: `^core/(${[layer, ...below].join('|')})/` },
}));

const doors = ['desktop', 'browser', 'command', 'window', 'engine', 'contract'];
const mayImport = {
  contract: [],
  engine: ['contract'],
  window: ['contract'],
  desktop: ['contract', 'engine', 'browser'],
  browser: ['contract', 'engine'],
  command: ['contract', 'engine', 'browser', 'desktop'],
};

module.exports = {
  forbidden: [
    ...layerRules,
    {
      name: 'core-is-pure',
      severity: 'error',
      comment: 'core imports nothing of app and no platform module',
      from: { path: '^core/' },
      to: { path: ['^app/', '^node_modules/(electron|svelte|plotly|ws)', '^(node:|fs$|path$|os$)'] },
    },
    { name: 'no-core-builtin', severity: 'error', from: { path: '^core/' }, to: { dependencyTypes: ['core'] } },
    ...doors.map((door) => ({
      name: `app-${door}`,
      severity: 'error',
      from: { path: `^app/${door}/` },
      to: { path: '^app/', pathNot: `^app/(${[door, ...mayImport[door]].join('|')})/` },
    })),
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: { extensions: ['.ts', '.svelte', '.svelte.ts', '.js', '.mjs'] },
  },
};
