// Import rules of DESIGN.md section 3: one total order of floors, one owner per heavy package, no cycles.
// A new folder of src, or a new file or folder of src/engineering, takes its place in one of the two lists.

const FLOORS = [
  'errors',
  'engineering',
  'store',
  'study',
  'inventory',
  'screening',
  'runs',
  'reports',
  'exports',
  'index',
  'cli',
];

// Rooms of one inner list are peers and do not import each other.
const ENGINEERING_FLOORS = [
  ['units'],
  ['direction'],
  ['building'],
  ['structure-columns'],
  ['building-columns'],
  ['columns'],
  ['quantity'],
  ['format'],
  ['source'],
  ['numeric'],
  ['formula'],
  ['expression'],
  ['trace'],
  ['prior'],
  ['period', 'site'],
  ['spectrum'],
  ['stiffness'],
  ['demand', 'vibration'],
  ['capacity', 'irregularity'],
  ['priority'],
  ['results'],
  ['assess'],
  ['hand-symbols'],
  ['hand'],
  ['methods'],
  ['calc-inputs'],
  ['calc'],
  ['page-outlook'],
  ['page-contract'],
];

/** Matches a floor, be it a file or a folder. */
const room = (under, names) => `^src/${under}(?:${names.join('|')})(?:/|[.]ts$)`;
/** A package whose name begins so; safe against slow matching, hence no nested repeats. */
const npm = (start) => `(?:^|/)node_modules/${start}`;

const floorRules = FLOORS.slice(0, -1).map((floor, i) => ({
  name: `floor-${floor}`,
  comment: `${floor} imports only from its left: ${FLOORS.slice(0, i).join(' < ') || 'nothing'}`,
  severity: 'error',
  from: { path: room('', [floor]) },
  to: { path: room('', [...FLOORS.slice(i + 1), 'browser']) },
}));

const engineeringRules = ENGINEERING_FLOORS.flatMap((peers, i) =>
  peers.map((name) => ({
    name: `engineering-floor-${name}`,
    comment: `engineering/${name} imports only from its left, and not from its peers`,
    severity: 'error',
    from: { path: room('engineering/', [name]) },
    to: {
      path: room('engineering/', [...peers, ...ENGINEERING_FLOORS.slice(i + 1).flat()]),
      pathNot: room('engineering/', [name]),
    },
  })),
);

const owner = (name, start, allowed) => ({
  name: `owner-${name}`,
  comment: `${name} is imported by ${allowed.join(' and ')} only`,
  severity: 'error',
  from: { path: '^src/', pathNot: room('', allowed) },
  to: { path: npm(start) },
});

// Rules speak of imports, so a stray file is caught when it imports something or something imports it.
const strays = [
  { path: '^src/', pathNot: room('', [...FLOORS, 'browser']) },
  { path: '^src/engineering/', pathNot: room('engineering/', ENGINEERING_FLOORS.flat()) },
];
const placeRules = strays.flatMap((stray) =>
  [
    { from: stray, to: {} },
    { from: { path: '^src/' }, to: stray },
  ].map((rule) => ({
    name: 'has-a-floor',
    comment: 'every file of src stands on a floor of the two lists',
    severity: 'error',
    ...rule,
  })),
);

module.exports = {
  forbidden: [
    ...floorRules,
    ...engineeringRules,
    {
      name: 'floor-browser',
      comment: 'browser imports engineering only',
      severity: 'error',
      from: { path: '^src/browser/' },
      to: { path: '^src/', pathNot: '^src/(?:browser|engineering)/' },
    },
    {
      name: 'floor-cli-browser',
      comment: 'nobody imports the browser client: reports takes its built text',
      severity: 'error',
      from: { path: '^src/', pathNot: '^src/browser/' },
      to: { path: '^src/browser/' },
    },
    ...placeRules,
    owner('duckdb', '@duckdb/', ['store']),
    owner('commander', 'commander/', ['cli']),
    owner('yaml', 'yaml/', ['study']),
    owner('zod', 'zod/', ['study']),
    owner('vega', 'vega', ['reports', 'browser']),
    owner('preact', 'preact', ['reports']),
    owner('fft', 'fft[.]js/', ['engineering/vibration/fourier']),
    {
      name: 'engineering-is-pure',
      comment: 'engineering knows no Node: it also runs in the browser',
      severity: 'error',
      from: { path: '^src/(?:engineering|browser)/|^src/errors[.]ts$' },
      to: { dependencyTypes: ['core'] },
    },
    {
      name: 'no-cycles',
      comment: 'a cycle means that something belongs a floor lower',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'no-dev-dependency',
      comment: 'what src imports must be in dependencies',
      severity: 'error',
      from: { path: '^src/' },
      to: { dependencyTypes: ['npm-dev', 'npm-no-pkg', 'npm-unknown'], pathNot: npm('@types/') },
    },
    {
      name: 'no-unresolvable',
      comment: 'every import leads to a file',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'no-tests-in-src',
      comment: 'src imports neither tests nor scripts',
      severity: 'error',
      from: { path: '^src/' },
      to: { path: '^(?:test|scripts)/' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    // Type-only imports count: the order holds for names as well as for code.
    tsPreCompilationDeps: true,
    tsConfig: { fileName: 'tsconfig.json' },
    enhancedResolveOptions: { exportsFields: ['exports'], conditionNames: ['import', 'node', 'types', 'default'] },
  },
};
