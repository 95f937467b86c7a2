import { parseSync } from 'vite';

/** One place where a file reaches for another: what it names, how, and on which line. */
export interface ImportFound {
  /** The module as written, without a query; null where it is computed and cannot be known. */
  target: string | null;
  kind: 'static' | 'type' | 'dynamic' | 'url';
  line: number;
}

/**
 * Every import of a TypeScript or JavaScript file, type-only ones, `import('x')` in types, re-exports, require and
 * `new URL('x', import.meta.url)` included. Reads the syntax tree of Vite's own parser. Throws where it cannot parse.
 */
export function readImports(name: string, text: string): ImportFound[] {
  const { program, errors } = parseSync(name, text);
  if (errors.length > 0) throw new Error(`${name} does not parse: ${errors[0].message}`);
  const found: ImportFound[] = [];
  walk(program as unknown as SyntaxNode, (node) => {
    const reach = readReach(node);
    if (reach !== undefined) found.push({ ...reach, line: text.slice(0, node.start).split('\n').length });
  });
  return found;
}

interface SyntaxNode {
  type: string;
  start: number;
  [part: string]: unknown;
}

function walk(node: SyntaxNode, visit: (node: SyntaxNode) => void): void {
  visit(node);
  for (const part of Object.values(node)) {
    for (const child of Array.isArray(part) ? part : [part]) {
      if (child !== null && typeof child === 'object' && typeof child.type === 'string') walk(child, visit);
    }
  }
}

function readReach(node: SyntaxNode): Omit<ImportFound, 'line'> | undefined {
  switch (node.type) {
    case 'ImportDeclaration':
    case 'ExportNamedDeclaration':
    case 'ExportAllDeclaration':
      if (!node.source) return undefined;
      return {
        target: literal(node.source),
        kind: node.importKind === 'type' || node.exportKind === 'type' ? 'type' : 'static',
      };
    case 'TSImportType':
      return { target: literal(node.source), kind: 'type' };
    case 'TSExternalModuleReference':
      return { target: literal(node.expression), kind: 'static' };
    case 'ImportExpression':
      return { target: literal(node.source), kind: 'dynamic' };
    case 'CallExpression':
      return isName(node.callee, 'require') ? { target: literal(first(node.arguments)), kind: 'dynamic' } : undefined;
    case 'NewExpression':
      return isName(node.callee, 'URL') && isOwnAddress((node.arguments as SyntaxNode[])[1])
        ? { target: literal(first(node.arguments)), kind: 'url' }
        : undefined;
    default:
      return undefined;
  }
}

function literal(node: unknown): string | null {
  const { type, value, quasis } = node as { type?: string; value?: unknown; quasis?: { value: { cooked: string } }[] };
  if (type === 'Literal' && typeof value === 'string') return value.replace(/\?.*$/, '');
  if (type === 'TemplateLiteral' && quasis?.length === 1) return quasis[0].value.cooked;
  return null;
}

function first(nodes: unknown): unknown {
  return (nodes as unknown[])[0] ?? {};
}

function isName(node: unknown, name: string): boolean {
  const { type, name: found } = node as { type: string; name?: string };
  return type === 'Identifier' && found === name;
}

/** Whether the node is `import.meta.url`, the base that makes a URL mean a file beside this one. */
function isOwnAddress(node: SyntaxNode | undefined): boolean {
  return node?.type === 'MemberExpression' && (node.object as SyntaxNode).type === 'MetaProperty';
}
