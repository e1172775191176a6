import { parse as parseSvelte } from 'svelte/compiler';
import ts from 'typescript';

/** Each module that a file reaches for; null where the name is only known when it runs. */
export type Specifiers = (string | null)[];

const isMetaProperty = (node: ts.Node, name: string) => node.getText().replace(/\s/g, '') === `import.meta.${name}`;

function literals(node: ts.Node | undefined): Specifiers {
  if (node === undefined) return [null];
  if (ts.isArrayLiteralExpression(node)) return node.elements.flatMap(literals);
  return [ts.isStringLiteralLike(node) ? node.text : null];
}

/** `import.meta.glob` and `new URL(…, import.meta.url)` reach for files as an import does. */
function reachedBy(node: ts.Node): Specifiers {
  if (ts.isImportDeclaration(node)) return literals(node.moduleSpecifier);
  if (ts.isExportDeclaration(node)) return node.moduleSpecifier ? literals(node.moduleSpecifier) : [];
  if (ts.isExternalModuleReference(node)) return literals(node.expression);
  if (ts.isImportTypeNode(node)) {
    return literals(ts.isLiteralTypeNode(node.argument) ? node.argument.literal : undefined);
  }
  if (ts.isCallExpression(node)) {
    const called = node.expression;
    const loads = called.kind === ts.SyntaxKind.ImportKeyword || (ts.isIdentifier(called) && called.text === 'require');
    return loads || isMetaProperty(called, 'glob') ? literals(node.arguments[0]) : [];
  }
  if (ts.isNewExpression(node) && node.expression.getText() === 'URL') {
    const [first, second] = node.arguments ?? [];
    return second && isMetaProperty(second, 'url') ? literals(first) : [];
  }
  return [];
}

function inTypescript(text: string): Specifiers {
  const found: Specifiers = [];
  const visit = (node: ts.Node) => {
    found.push(...reachedBy(node));
    ts.forEachChild(node, visit);
  };
  visit(ts.createSourceFile('module.ts', text, ts.ScriptTarget.ESNext, true));
  return found;
}

function inCss(text: string): Specifiers {
  const bare = text.replace(/\/\*.*?\*\//gs, '');
  const named = [...bare.matchAll(/@import\s+['"]([^'"]+)|url\(\s*['"]?([^'")]+)/g)].map(
    (each) => each[1] ?? each[2] ?? '',
  );
  return named.filter((each) => !/^(data:|#)/.test(each));
}

/** Pieces of a component's text: its scripts and every expression in its markup, each read as TypeScript. */
function inSvelte(text: string): Specifiers {
  const { css, instance, module, fragment } = parseSvelte(text, { modern: true });
  const pieces: string[] = [];
  const take = (node: { start: number; end: number }) => pieces.push(text.slice(node.start, node.end));
  for (const script of [instance, module]) {
    if (script) take(script.content as unknown as { start: number; end: number });
  }
  const visit = (value: unknown) => {
    if (typeof value !== 'object' || value === null) return;
    const node = value as { type?: string; start: number; end: number };
    if (node.type === 'ImportExpression' || node.type === 'NewExpression') take(node);
    else Object.values(value).forEach(visit);
  };
  visit(fragment);
  return [...pieces.flatMap(inTypescript), ...(css ? inCss(css.content.styles) : [])];
}

export function importsOf(path: string, text: string): Specifiers {
  if (path.endsWith('.svelte')) return inSvelte(text);
  if (path.endsWith('.css')) return inCss(text);
  return /\.[jt]s$/.test(path) ? inTypescript(text) : [];
}
