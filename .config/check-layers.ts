import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { createRequire, isBuiltin } from 'node:module';
import { join, posix, relative } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type ImportFound, readImports } from './read-imports.ts';

interface Layer {
  name: string;
  at: string[];
  sisters?: string;
  runs: 'anywhere' | 'node' | 'browser';
  layers: string[];
  packages: string[];
  importsComputed?: boolean;
}

interface LayerTable {
  everyone: string[];
  layers: Layer[];
  vagueNames: string[];
  allowedVagueFiles: string[];
  topLevel: string[];
  made: string[];
}

interface LayerReport {
  filesRead: number;
  importsRead: number;
  /** One sentence for each thing that breaks a rule, with its file and line. */
  findings: string[];
}

/** The table of this project. */
export function readLayerTable(): LayerTable {
  return createRequire(import.meta.url)('./layers.cjs');
}

/** Holds a whole tree against the layer table: imports, cycles, sister features and the shape of names and folders. */
export function checkLayers(root: string, table: LayerTable): LayerReport {
  const files = listFiles(root, table.made);
  const findings = files.flatMap((file) => checkShape(file, table));
  const importsOf = new Map<string, string[]>();
  let importsRead = 0;
  for (const file of files.filter(isCode)) {
    const imports = readImports(file, readFileSync(join(root, file), 'utf8'));
    importsRead += imports.length;
    importsOf.set(
      file,
      imports.filter(isRelative).map((found) => resolveFrom(file, found.target as string)),
    );
    for (const found of imports) {
      const fault = checkImport(root, file, found, table);
      if (fault !== undefined) findings.push(`${file}:${found.line} ${fault}`);
    }
  }
  return { filesRead: importsOf.size, importsRead, findings: [...findings, ...findCycles(importsOf)] };
}

function listFiles(root: string, made: string[]): string[] {
  const isHidden = (name: string) => name.startsWith('.') || made.includes(name);
  return readdirSync(root, { withFileTypes: true })
    .filter((entry) => !isHidden(entry.name))
    .flatMap((entry) =>
      entry.isDirectory()
        ? readdirSync(join(root, entry.name), { withFileTypes: true, recursive: true })
            .filter((inner) => inner.isFile())
            .map((inner) => relative(root, join(inner.parentPath, inner.name)).replaceAll('\\', '/'))
        : [entry.name],
    );
}

function isCode(file: string): boolean {
  return isLayered(file) && ['.ts', '.mjs', '.cjs', '.js'].includes(posix.extname(file));
}

function isLayered(file: string): boolean {
  return file.startsWith('src/') || file.startsWith('renderer/');
}

function checkShape(file: string, table: LayerTable): string[] {
  const faults: string[] = [];
  const parts = file.split('/');
  if (!table.topLevel.includes(parts[0])) faults.push(`${file} the top of the tree has no place for ${parts[0]}`);
  if (isLayered(file) && layerOf(file, table) === undefined) faults.push(`${file} is in no layer of the table`);
  if (!isLayered(file) && parts[0] !== 'tests') return faults;
  for (const part of parts) {
    const name = part.split('.')[0];
    if (!/^[a-z0-9]+(-[a-z0-9]+)*$/.test(name) && part !== 'README.md')
      faults.push(`${file} ${part} is not kebab-case`);
    if (table.vagueNames.includes(name) && !table.allowedVagueFiles.includes(file)) {
      faults.push(`${file} the name ${name} says nothing of what it gives`);
    }
  }
  return faults;
}

function checkImport(root: string, file: string, found: ImportFound, table: LayerTable): string | undefined {
  const layer = layerOf(file, table);
  if (layer === undefined) return undefined;
  if (found.target === null)
    return layer.importsComputed ? undefined : 'imports something computed, which no rule can read';
  if (!isRelative(found)) return found.kind === 'url' ? undefined : checkPackage(layer, found.target);
  const target = resolveFrom(file, found.target);
  if (found.kind === 'url' && !isLayered(target)) return layer.runs === 'node' ? undefined : `reaches ${target}`;
  if (!existsSync(join(root, target))) return `imports ${target}, which is not there`;
  const other = layerOf(target, table);
  if (other === undefined) return `imports ${target}, which is in no layer`;
  if (other !== layer)
    return mayImport(layer, other, table) ? undefined : `${layer.name} may not import ${other.name} (${target})`;
  return areSisters(layer, file, target) ? `imports its sister ${target}` : undefined;
}

function checkPackage(layer: Layer, specifier: string): string | undefined {
  if (isBuiltin(specifier)) {
    return layer.runs === 'node' ? undefined : `${layer.name} runs ${layer.runs} and may not use ${specifier}`;
  }
  const name = specifier
    .split('/')
    .slice(0, specifier.startsWith('@') ? 2 : 1)
    .join('/');
  return layer.packages.includes(name) ? undefined : `${layer.name} may not import the package ${name}`;
}

function mayImport(layer: Layer, other: Layer, table: LayerTable): boolean {
  const isFoundation = table.everyone.includes(layer.name);
  return layer.layers.includes(other.name) || (!isFoundation && table.everyone.includes(other.name));
}

function areSisters(layer: Layer, file: string, target: string): boolean {
  const feature = featureOf(layer, file);
  const other = featureOf(layer, target);
  return feature !== undefined && other !== undefined && feature !== other && other !== 'shared';
}

/** The folder below the layer's `sisters` that a file lies in; undefined for a file that lies in none. */
function featureOf(layer: Layer, file: string): string | undefined {
  if (layer.sisters === undefined || !file.startsWith(`${layer.sisters}/`)) return undefined;
  const parts = file.slice(layer.sisters.length + 1).split('/');
  return parts.length > 1 ? parts[0] : undefined;
}

function layerOf(file: string, table: LayerTable): Layer | undefined {
  return table.layers.find((layer) => layer.at.some((place) => file === place || file.startsWith(`${place}/`)));
}

function isRelative(found: ImportFound): boolean {
  return found.target?.startsWith('.') ?? false;
}

function resolveFrom(file: string, target: string): string {
  return posix.join(posix.dirname(file), target);
}

/** Each ring of files that import one another, told once, from the file first in the alphabet. */
function findCycles(importsOf: Map<string, string[]>): string[] {
  const cycles = new Set<string>();
  const done = new Set<string>();
  const path: string[] = [];
  const follow = (file: string): void => {
    const start = path.indexOf(file);
    if (start >= 0) {
      const ring = path.slice(start);
      const first = ring.indexOf([...ring].sort()[0]);
      cycles.add([...ring.slice(first), ...ring.slice(0, first), ring[first]].join(' -> '));
    }
    if (start >= 0 || done.has(file)) return;
    path.push(file);
    for (const next of importsOf.get(file) ?? []) follow(next);
    path.pop();
    done.add(file);
  };
  for (const file of importsOf.keys()) follow(file);
  return [...cycles].map((ring) => `${ring} import one another in a ring`);
}

if (import.meta.main) {
  const report = checkLayers(fileURLToPath(new URL('..', import.meta.url)), readLayerTable());
  for (const finding of report.findings) console.error(finding);
  console.log(`${report.filesRead} files and ${report.importsRead} imports read, ${report.findings.length} findings`);
  process.exitCode = report.findings.length > 0 || report.filesRead === 0 ? 1 : 0;
}
