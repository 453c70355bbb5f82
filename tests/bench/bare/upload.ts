import { createWriteStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { createServer } from 'node:http';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { BareUploadSettings } from './settings.ts';

/** A request's bytes piped to a file and flushed: no form, no sum, no look at what it is, no second copy. */
const settings = JSON.parse(process.env['BARE_SETTINGS'] ?? '') as BareUploadSettings;
let number = 0;
const http = createServer((req, res) => {
  if (req.method !== 'POST') return void res.end('{}');
  const path = join(settings.folder, String((number += 1)));
  pipeline(req, createWriteStream(path, { flush: true }))
    .then(() => res.writeHead(201).end('{}'))
    .catch(() => res.destroy())
    // Kept files would fill the disk within a run; both sides' are removed by the measurement.
    .finally(() => void rm(path, { force: true }));
});
http.listen(settings.port, '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));
