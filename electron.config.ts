import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { defineConfig, type Plugin, type UserConfig } from 'vite';

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** The Electron host and the loading thread. Packages stay outside: the archive's library is native. */
const main: UserConfig = {
  publicDir: false,
  build: {
    ssr: true,
    target: 'node24',
    outDir: here('dist/main'),
    emptyOutDir: true,
    rolldownOptions: {
      input: { main: here('src/hosts/electron/main.ts'), 'load-worker': here('src/workers/load-worker.ts') },
      external: ['electron'],
      checks: { pluginTimings: false },
      output: { entryFileNames: '[name].js', chunkFileNames: '[name]-[hash].js' },
    },
  },
};

/** The page that every host serves. There is no preload: the page asks its own origin, in Electron too. */
const renderer: UserConfig = {
  root: here('renderer'),
  base: './',
  plugins: [shipCoastline()],
  build: {
    target: 'chrome140',
    outDir: here('dist/renderer'),
    emptyOutDir: true,
    // Files that the content policy forbids as data: URLs (fonts) stay files.
    assetsInlineLimit: 0,
    chunkSizeWarningLimit: 2000,
    // A busy machine is no fault of a plugin.
    rolldownOptions: { checks: { pluginTimings: false } },
  },
};

/** Puts the base map's land beside the page, at coastline/NAME.json. */
function shipCoastline(): Plugin {
  const folder = here('assets/coastline');
  return {
    name: 'ship-coastline',
    generateBundle() {
      for (const name of readdirSync(folder).filter((file) => file.endsWith('.json'))) {
        this.emitFile({ type: 'asset', fileName: `coastline/${name}`, source: readFileSync(`${folder}/${name}`) });
      }
    },
  };
}

export default defineConfig(({ mode }) => (mode === 'main' ? main : renderer));
