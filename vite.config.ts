/// <reference types="vitest/config" />
import { defineConfig } from 'vite'
import type { Plugin } from 'vite'
import react from '@vitejs/plugin-react'
import tailwindcss from '@tailwindcss/vite'

const files = (...folders: string[]) => folders.map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`)
const withPostgres = { globalSetup: ['tests/support/postgres.ts'], pool: 'forks' as const }

/** Nothing is painted before the script has set the person's light: a dark gallery must not flash white. */
const paintAfterTheme: Plugin = {
  name: 'paint-after-theme',
  transformIndexHtml: {
    order: 'post',
    handler: (html) => html.replace('<script type="module" crossorigin ', '$&blocking="render" '),
  },
}

export default defineConfig({
  plugins: [react(), tailwindcss(), paintAfterTheme],
  // Fonts stay files: the content security policy takes none from data addresses
  build: { outDir: 'dist/client', manifest: true, assetsInlineLimit: 0 },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          environment: 'node',
          include: files('domain', 'published-values', 'contracts', 'architecture', 'pdf', 'platform'),
          testTimeout: 60_000,
        },
      },
      { extends: true, test: { name: 'client', environment: 'happy-dom', include: files('client') } },
      {
        extends: true,
        test: {
          name: 'postgres',
          environment: 'node',
          include: files('database', 'api'),
          ...withPostgres,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          environment: 'node',
          include: files('browser'),
          ...withPostgres,
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
