import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

/** ms; a machine that does five things at once must not fail a test that a quiet one passes. */
const patience = { testTimeout: 30_000, hookTimeout: 30_000 }

/** Test files by what they need to run; `npm test` runs each project and adds up the counts. */
const unitTests = ['shared/**/*.test.ts', 'server/**/*.test.ts', 'seed/**/*.test.ts']

export default defineConfig({
  plugins: [react(), tailwindcss()],
  build: {
    outDir: 'dist/client',
    sourcemap: true,
    target: 'es2022',
    // The content policy allows no data: addresses for fonts.
    assetsInlineLimit: 0,
    // Read by the benchmark that weighs a page's scripts.
    manifest: true,
    rolldownOptions: {
      output: {
        // One file of what every page needs: it packs better than three, and stays cached over releases of our own.
        codeSplitting: {
          groups: [
            {
              name: 'framework',
              test: /node_modules[\\/](react|react-dom|react-router|react-router-dom|scheduler|@tanstack|zod)[\\/]/,
            },
          ],
        },
      },
    },
  },
  server: { strictPort: true },
  test: {
    projects: [
      { test: { name: 'unit', environment: 'node', include: unitTests, ...patience } },
      { test: { name: 'guards', environment: 'node', include: ['tests/guards/**/*.test.ts'], ...patience } },
      {
        test: {
          name: 'reference',
          environment: 'node',
          include: ['tests/reference/**/*.test.ts', 'tests/cases/*.test.ts'],
          ...patience,
        },
      },
      {
        test: {
          name: 'api',
          environment: 'node',
          include: ['tests/api/**/*.test.ts'],
          globalSetup: ['tests/setup/cluster.ts'],
          ...patience,
        },
      },
      {
        extends: true,
        test: {
          name: 'client',
          environment: 'jsdom',
          include: ['src/**/*.test.{ts,tsx}'],
          setupFiles: ['tests/setup/client.ts'],
          ...patience,
        },
      },
      {
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/browser/**/*.test.ts'],
          globalSetup: ['tests/setup/cluster.ts'],
          hookTimeout: 60_000,
          testTimeout: 90_000,
        },
      },
    ],
  },
})
