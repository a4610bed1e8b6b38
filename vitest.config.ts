import { defineConfig } from 'vitest/config';

export default defineConfig({
  // TypeORM's legacy decorators; entities name a type on every column, so no decorator metadata.
  esbuild: {
    target: 'es2022',
    tsconfigRaw: {
      compilerOptions: { experimentalDecorators: true, useDefineForClassFields: false },
    },
  },
  test: {
    include: ['spec/**/*.spec.ts'],
    environment: 'node',
    pool: 'forks',
    maxWorkers: 2,
    testTimeout: 30_000,
    hookTimeout: 30_000,
  },
});
