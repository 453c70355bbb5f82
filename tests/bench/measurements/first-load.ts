import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { build } from 'vite';
import type { Measurement } from '../support/bench.ts';
import { verdictOf } from '../support/paired.ts';
import type { Line } from '../support/report.ts';

const GOAL_KB = 150;
const ENTRY = 'index.html';
const MENU = 'src/app/person-menu.tsx';
/** Comes when the page is idle. */
const SOCKET = 'node_modules/socket.io-client/build/esm/index.js';

interface Chunk {
  readonly file: string;
  readonly imports?: readonly string[];
  readonly css?: readonly string[];
}
type Manifest = Readonly<Record<string, Chunk>>;

/** Pages that people land on, by the modules their address loads beside the entry. */
const LANDINGS = {
  'sign-in': ['src/app/routes/sign-in.tsx'],
  'bench, home of everyone': ['src/app/routes/bench.tsx', MENU],
  'commission, for makers and for the client': [
    'src/app/routes/commission-layout.tsx',
    'src/app/routes/room.tsx',
    MENU,
  ],
  'thread, opened from a letter': ['src/app/routes/commission-layout.tsx', 'src/app/routes/thread.tsx', MENU],
} as const;

/** A module and all that it imports at once; lazy modules are left out. */
function withImports(manifest: Manifest, key: string, found = new Set<string>()): Set<string> {
  const chunk = manifest[key];
  if (!chunk) throw new Error(`The build has no module ${key}`);
  if (!found.has(key)) {
    found.add(key);
    for (const next of chunk.imports ?? []) withImports(manifest, next, found);
  }
  return found;
}

const kilobytes = (bytes: number): string => `${(bytes / 1000).toFixed(1)} kB`;

/** Compressed JavaScript that each landing page loads before it is whole, from a build made for this. */
export const firstLoad: Measurement = {
  title: 'First load (gzip level 6, kB of 1000 bytes)',
  async run() {
    const folder = await mkdtemp(join(tmpdir(), 'ferrule-bench-build-'));
    try {
      await build({ logLevel: 'error', build: { outDir: folder, emptyOutDir: true } });
      const read = (file: string): Promise<Buffer> => readFile(join(folder, file));
      const gzipBytes = async (files: Iterable<string>): Promise<number> => {
        let sum = 0;
        for (const file of files) sum += gzipSync(await read(file), { level: 6 }).length;
        return sum;
      };
      const manifest = JSON.parse((await read('.vite/manifest.json')).toString()) as Manifest;
      const lines: Line[] = [];
      for (const [what, modules] of Object.entries(LANDINGS)) {
        const keys = new Set([ENTRY, ...modules].flatMap((key) => [...withImports(manifest, key)]));
        const files = new Set([...keys].map((key) => manifest[key]?.file ?? ''));
        const bytes = await gzipBytes(files);
        const kB = bytes / 1000;
        lines.push({
          what: `JavaScript of ${what}`,
          figure: kilobytes(bytes),
          detail: `${files.size} files`,
          goal: `under ${GOAL_KB} kB`,
          verdict: verdictOf({ median: kB, min: kB, max: kB }, { atMost: GOAL_KB }),
        });
      }
      lines.push({
        what: 'JavaScript of the connection, once the page is idle',
        figure: kilobytes(await gzipBytes([manifest[SOCKET]?.file ?? ''])),
      });
      const css = new Set(Object.values(manifest).flatMap((chunk) => chunk.css ?? []));
      lines.push({ what: 'style sheets, all', figure: kilobytes(await gzipBytes(css)), detail: `${css.size} file` });
      const page = (await read(ENTRY)).toString();
      for (const [, font] of page.matchAll(/href="\/(assets\/[^"]+\.woff2)"/g))
        if (font)
          lines.push({
            what: 'font preloaded by the page',
            figure: kilobytes((await read(font)).length),
            detail: font.replace(/^assets\/|-[^-]+(?=\.woff2)/g, ''),
          });
      return lines;
    } finally {
      await rm(folder, { recursive: true, force: true });
    }
  },
};
