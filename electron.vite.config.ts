import { fileURLToPath } from 'node:url';
import vue from '@vitejs/plugin-vue';
import { defineConfig } from 'electron-vite';

const at = (path: string) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  main: {
    // Its build for Node declares a `require` of its own, which the one that is put before each chunk forbids.
    resolve: { alias: { fflate: 'fflate/browser' } },
    build: {
      outDir: 'out/main',
      externalizeDeps: { exclude: [] },
      rolldownOptions: {
        input: {
          main: at('src-main/main.ts'),
          loopback: at('src-main/loopback.ts'),
          cli: at('src-main/cli.ts'),
          launch: at('src-main/launch.ts'),
          worker: at('src-main/worker.ts'),
        },
        output: { format: 'es' },
      },
    },
  },
  preload: {
    build: {
      outDir: 'out/preload',
      externalizeDeps: false,
      rolldownOptions: {
        input: { preload: at('src-main/preload.ts') },
        // A sandboxed preload cannot be an ES module, nor load a second file.
        output: { format: 'cjs', entryFileNames: '[name].cjs' },
      },
    },
  },
  renderer: {
    root: 'src-renderer',
    build: {
      outDir: at('out/renderer'),
      assetsInlineLimit: 0,
      rolldownOptions: { input: at('src-renderer/index.html') },
    },
    plugins: [vue()],
  },
});
