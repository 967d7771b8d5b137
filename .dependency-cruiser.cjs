/** Imports run one way; see DEVELOPERS.md for the picture. */
const calc = '^backend/src/calc';
module.exports = {
  forbidden: [
    { name: 'no-circular', severity: 'error', from: { pathNot: '\\.entity\\.ts$' }, to: { circular: true, viaOnly: { pathNot: '\\.entity\\.ts$' } } },
    { name: 'calc-is-pure', comment: 'calc knows nothing but itself and common', severity: 'error',
      from: { path: calc, pathNot: '\\.spec\\.ts$' }, to: { pathNot: [calc, '^common/src', '@mantlet/common'] } },
    { name: 'calc-through-its-index', severity: 'error',
      from: { path: '^backend/src/(features|worker|shared|database)', pathNot: '\\.spec\\.ts$' }, to: { path: `${calc}/.+`, pathNot: `${calc}/index\\.ts$` } },
    { name: 'shared-imports-no-feature', severity: 'error', from: { path: '^backend/src/shared' }, to: { path: '^backend/src/(features|worker)' } },
    { name: 'feature-through-its-service', comment: 'a feature uses another through its module, service or entity', severity: 'error',
      from: { path: '^backend/src/features/([^/]+)/', pathNot: '\\.spec\\.ts$' },
      to: { path: '^backend/src/features/([^/]+)/', pathNot: ['^backend/src/features/$1/', '\\.(service|module|entity)\\.ts$'] } },
    { name: 'common-imports-nothing-of-ours', severity: 'error', from: { path: '^common/src' }, to: { path: '^(backend|frontend)' } },
    { name: 'frontend-not-backend', severity: 'error', from: { path: '^frontend/src' }, to: { path: '^backend' } },
    { name: 'ui-below-features', severity: 'error', from: { path: '^frontend/src/ui' }, to: { path: '^frontend/src/(features|app)' } },
    { name: 'lib-at-the-bottom', severity: 'error', from: { path: '^frontend/src/lib' }, to: { path: '^frontend/src/(features|app|ui)' } },
    { name: 'features-below-app', severity: 'error', from: { path: '^frontend/src/features' }, to: { path: '^frontend/src/app' } },
  ],
  options: {
    tsPreCompilationDeps: false,
    tsConfig: { fileName: 'tsconfig.depcruise.json' },
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '(/dist/|\\.spec\\.tsx?$)' },
    enhancedResolveOptions: { extensions: ['.ts', '.tsx', '.js'] },
  },
};
