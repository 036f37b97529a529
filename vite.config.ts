import tailwindcss from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'
import { messageCatalogs } from './web/vite/message-catalogs.ts'

export default defineConfig({
  plugins: [react(), tailwindcss(), messageCatalogs()],
  publicDir: false,
  build: {
    outDir: 'dist/web',
    emptyOutDir: true,
    manifest: true,
    sourcemap: false,
    assetsDir: 'assets',
    // Fonts stay files: a face inlined into the style sheet would be fetched by readers who never see it.
    assetsInlineLimit: 0,
    rollupOptions: { input: ['web/main-store.tsx', 'web/main-desk.tsx'] },
  },
  test: {
    include: ['{shared,server,emails,web,fakes,e2e}/**/*.test.{ts,tsx}'],
    pool: 'forks',
    testTimeout: 60_000,
    hookTimeout: 60_000,
    maxWorkers: 2,
  },
})
