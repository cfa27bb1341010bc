const { createHash } = require('node:crypto');
const { readFileSync } = require('node:fs');
const { transformSync, version } = require('esbuild');

const self = readFileSync(__filename);

/** Jest transform: TypeScript or ES modules to CommonJS, by the same tool that bundles the server. */
module.exports = {
  getCacheKey(source, path) {
    return createHash('sha1')
      .update(version)
      .update(self)
      .update(path)
      .update(source)
      .digest('hex');
  },
  process(source, path) {
    const { code, map } = transformSync(source, {
      loader: path.endsWith('.ts') ? 'ts' : 'js',
      format: 'cjs',
      target: 'node20',
      // `import()` must become `require`: jest's sandbox has no dynamic import.
      supported: { 'dynamic-import': false },
      sourcemap: 'external',
      sourcefile: path,
    });
    return { code, map };
  },
};
