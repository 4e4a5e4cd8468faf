// Who may import whom. `sees`: the folders of ours a layer may import besides itself; `uses`: the packages.
// Nothing imports upwards, in circles, or from a folder that has no line here.
const core = ['src/units', 'src/solver', 'src/catalogue', 'src/touch', 'src/money', 'src/sizing']
const model = [...core, 'src/model']

const layers = {
  'src/units': {},
  'src/solver': {},
  'src/catalogue': { sees: ['src/solver'] },
  'src/touch': { sees: ['src/catalogue'] },
  'src/money': { sees: ['src/catalogue'] },
  'src/sizing': { sees: ['src/solver', 'src/catalogue', 'src/touch', 'src/money'] },
  'src/model': { sees: core, uses: ['zod'] },
  'src/report': { sees: model, uses: ['zod', 'papaparse'] },
  'src/contract': { sees: ['src/model', 'src/catalogue'], uses: ['zod', 'devalue'] },
  'src/worker': { sees: model },
  'src/backend': {
    sees: ['src/contract', 'src/report', ...model],
    uses: ['better-sqlite3', 'papaparse', 'zod', 'node:'],
  },
  'src/host': { sees: ['src/backend', 'src/contract'], uses: ['node:'] },
  'src/cli': { sees: ['src/backend', 'src/report', ...model], uses: ['node:'] },
  'src/ui/components': { sees: ['src/units'], uses: ['svelte', 'bits-ui', 'chart.js'] },
  'src/ui/state': {
    sees: ['src/model', 'src/contract', 'src/worker', 'src/units', 'src/catalogue', 'src/sizing'],
    uses: ['svelte'],
  },
  'src/ui/views': {
    sees: [
      'src/ui/components',
      'src/ui/state',
      'src/model',
      'src/report',
      'src/units',
      'src/sizing',
      'src/catalogue',
    ],
    uses: ['svelte'],
  },
  // vite only in build.mjs, which `npm start` needs and no package holds.
  electron: {
    sees: ['src/backend', 'src/contract'],
    uses: ['electron', '@electron/get', 'vite', 'zod', 'node:'],
  },
}

// Files that stand directly in src/ui put the window together, so they may see all of it.
const known = ['^src/ui/[^/]+$', ...Object.keys(layers).map((layer) => `^${layer}/`)]

const ours = '^(src|electron|tests)/'

const perLayer = Object.entries(layers).flatMap(([layer, { sees = [], uses = [] }]) => [
  {
    name: `${layer} sees only what is below it`,
    severity: 'error',
    from: { path: `^${layer}/` },
    to: { path: ours, pathNot: [layer, ...sees].map((folder) => `^${folder}/`) },
  },
  {
    name: `${layer} uses only its own packages`,
    severity: 'error',
    from: { path: `^${layer}/` },
    to: {
      // package.json tells the version; reading files is what it takes.
      pathNot: [
        ours,
        ...uses.map((name) => `(^|/)node_modules/${name}/|^${name}$`),
        ...(uses.includes('node:') ? ['^package\\.json$'] : []),
      ],
      ...(uses.includes('node:') && { dependencyTypesNot: ['core'] }),
      couldNotResolve: false,
    },
  },
])

/** @type {import('dependency-cruiser').IConfiguration} */
export default {
  forbidden: [
    ...perLayer,
    {
      name: 'no circles',
      severity: 'error',
      from: {},
      to: { circular: true },
    },
    {
      name: 'every import is found',
      severity: 'error',
      from: {},
      to: { couldNotResolve: true },
    },
    {
      name: 'every folder under src has a layer',
      severity: 'error',
      from: { path: '^src/', pathNot: known },
      to: {},
    },
    {
      name: 'every folder under src has a layer, also one that imports nothing',
      severity: 'error',
      from: { orphan: true, path: '^src/', pathNot: known },
      to: {},
    },
    {
      name: 'every folder under src has a layer, also one that is only imported',
      severity: 'error',
      from: {},
      to: { path: '^src/', pathNot: known },
    },
    {
      name: 'the program knows no tests',
      severity: 'error',
      from: { path: '^(src|electron)/' },
      to: { path: '^tests/' },
    },
    {
      name: 'src knows no desktop shell',
      severity: 'error',
      from: { path: '^src/' },
      to: { path: '^electron/' },
    },
    {
      name: 'the window reaches data only through the contract',
      severity: 'error',
      from: { path: '^src/ui/' },
      to: { path: '^(src/(backend|host|cli)/|node:)|node_modules/(better-sqlite3|electron)/' },
    },
    {
      name: 'the solver is entered by its index',
      severity: 'error',
      from: { path: '^(src|electron)/', pathNot: '^src/solver/' },
      to: { path: '^src/solver/', pathNot: '^src/solver/(index|types)\\.ts$' },
    },
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    tsConfig: { fileName: 'tsconfig.json' },
    // Type-only imports count: a type from above is a dependency upwards as well.
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      extensions: ['.ts', '.svelte', '.mjs', '.js', '.json'],
      exportsFields: ['exports'],
      conditionNames: ['svelte', 'import', 'node', 'default', 'types'],
    },
  },
}
