import { readFile, realpath } from 'node:fs/promises';
import { extname, join, sep } from 'node:path';
import { Problem } from '../problems/problem.ts';
import { respond } from './responses.ts';

/** What a file of the renderer is, by its ending. Anything else is not served. */
const contentTypes: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.mjs': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json',
  '.geojson': 'application/geo+json',
  '.wasm': 'application/wasm',
  '.woff2': 'font/woff2',
  '.woff': 'font/woff',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.ico': 'image/vnd.microsoft.icon',
  '.txt': 'text/plain; charset=utf-8',
};

/** One file of a folder by the path of an address; '/' is index.html. Throws 'not-found' for all that is not in it. */
export async function answerStatic(folder: string, pathname: string): Promise<Response> {
  const path = await findInside(folder, pathname);
  const type = contentTypes[extname(path)];
  if (!type) throw notFound(pathname);
  const bytes = await readFile(path).catch(() => {
    throw notFound(pathname);
  });
  return respond(bytes, 200, { 'content-type': type });
}

/** The real path of a file, links followed, when it lies inside the folder. */
async function findInside(folder: string, pathname: string): Promise<string> {
  const name = decode(pathname);
  if (/[\\\0]/.test(name)) throw notFound(pathname);
  try {
    const root = await realpath(folder);
    const path = await realpath(join(root, name === '/' ? 'index.html' : name));
    if (path.startsWith(root + sep)) return path;
  } catch {
    throw notFound(pathname);
  }
  throw notFound(pathname);
}

function decode(pathname: string): string {
  try {
    return decodeURIComponent(pathname);
  } catch {
    throw notFound(pathname);
  }
}

function notFound(pathname: string): Problem {
  return new Problem('not-found', `There is nothing at ${pathname.slice(0, 200)}.`);
}
