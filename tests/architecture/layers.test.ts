import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import ts from 'typescript';
import { describe, expect, test } from 'vitest';

/** Layer -> what it may import of ours. A pair that is not written here is forbidden. DEVELOPERS.md draws the same. */
const MAY_IMPORT: Readonly<Record<string, readonly string[]>> = {
  'api/crochet': [],
  'api/contract': ['api/crochet'],
  'api/env.ts': [],
  'api/platform': ['api/env.ts'],
  'api/http': ['api/contract', 'api/platform', 'api/env.ts types'],
  'api/features': ['api/crochet', 'api/contract', 'api/platform', 'api/http', 'api/env.ts types'],
  'api/local': ['api/env.ts', 'api/platform'],
  api: ['api/crochet', 'api/contract', 'api/env.ts', 'api/platform', 'api/http', 'api/features', 'api/local'],
  'storage-fake': ['api/env.ts', 'api/platform'],
  migrations: ['api/env.ts', 'api/platform'],
  'knexfile.ts': ['api/env.ts', 'api/platform'],
  seeds: ['api/env.ts', 'api/platform', 'api/http types', 'api/features', 'api/contract', 'api/crochet'],
  'web/ui': ['web/lib'],
  'web/lib': ['api/contract'],
  'web/parts': ['web/ui', 'web/lib', 'api/contract types', 'api/crochet/shape', 'api/crochet types'],
  'web/features': ['web/parts', 'web/ui', 'web/lib', 'api/contract', 'api/crochet', 'api/crochet/shape'],
  'web/watch': ['web/parts', 'web/ui', 'web/lib', 'api/contract types', 'api/crochet/shape', 'api/crochet types'],
  'web/count': ['web/parts', 'web/ui', 'web/lib', 'api/crochet', 'api/crochet/shape'],
  'web/app': [
    'web/features',
    'web/parts',
    'web/ui',
    'web/lib',
    'web/app',
    'api/contract',
    'api/crochet',
    'api/crochet/shape',
  ],
  web: ['web/app', 'web/features', 'web/parts', 'web/ui', 'web/lib', 'api/contract', 'api/crochet'],
};
/** The doors of the library: whoever is outside of it goes through one of them. */
const DOORS: Readonly<Record<string, string>> = {
  '#crochet': 'api/crochet/index.ts',
  '#crochet/shape': 'api/crochet/shape/index.ts',
};
/** Packages that stand behind `api/platform`; their types are free. */
const PLATFORM_ONLY = /^(?:pg|pg-.*|knex|@aws-sdk\/.*|nodemailer|graphile-worker|stripe|pino)$/;

interface Import {
  readonly spec: string;
  readonly typesOnly: boolean;
}

/** What a file imports, by `import`, `export … from`, `import()` and types in place. */
function importsOf(source: string, file = 'file.tsx'): Import[] {
  const tree = ts.createSourceFile(file, source, ts.ScriptTarget.Latest);
  const found: Import[] = [];
  const visitTop = (node: ts.Node): void => {
    if ((ts.isImportDeclaration(node) || ts.isExportDeclaration(node)) && node.moduleSpecifier) {
      const spec = (node.moduleSpecifier as ts.StringLiteral).text;
      found.push({ spec, typesOnly: ts.isImportDeclaration(node) ? isTypeImport(node) : node.isTypeOnly });
    }
  };
  const visit = (node: ts.Node): void => {
    visitTop(node);
    if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
      const [spec] = node.arguments;
      if (spec && ts.isStringLiteralLike(spec)) found.push({ spec: spec.text, typesOnly: false });
    } else if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
      found.push({ spec: (node.argument.literal as ts.StringLiteral).text, typesOnly: true });
    }
    ts.forEachChild(node, visit);
  };
  // Imports stand at the top of a file; only `import(…)` may hide deeper in it.
  if (source.includes('import(')) visit(tree);
  else tree.statements.forEach(visitTop);
  return found;
}

function isTypeImport({ importClause: clause }: ts.ImportDeclaration): boolean {
  if (!clause) return false;
  if (clause.phaseModifier === ts.SyntaxKind.TypeKeyword) return true;
  const names = clause.namedBindings;
  return (
    !clause.name && names !== undefined && ts.isNamedImports(names) && names.elements.every((each) => each.isTypeOnly)
  );
}

/** The layer of a file: the longest entry of the table that it lies in. */
function layerOf(file: string): string | undefined {
  return Object.keys(MAY_IMPORT)
    .filter((layer) => file === layer || file.startsWith(`${layer}/`))
    .sort((a, b) => b.length - a.length)[0];
}

/** The file of ours that is meant, or undefined for a package. */
function targetOf(from: string, spec: string): string | undefined {
  const door = DOORS[spec];
  if (door !== undefined) return door;
  if (spec.startsWith('#contract/')) return `api/contract/${spec.slice('#contract/'.length)}.ts`;
  if (spec.startsWith('.')) return path.posix.join(path.posix.dirname(from), spec);
  return undefined;
}

const featureOf = (file: string) => file.split('/')[2];

function isAllowedPackage(layer: string, { spec, typesOnly }: Import): boolean {
  if (layer === 'api/crochet') return false;
  if (layer === 'api/contract') return spec === 'zod';
  const behindPlatform = PLATFORM_ONLY.test(spec) && !typesOnly;
  return !behindPlatform || layer === 'api/platform';
}

function isAllowedFile(from: string, layer: string, to: string, { spec, typesOnly }: Import): boolean {
  const target = layerOf(to);
  if (target === undefined) return false;
  if (layer === 'api/crochet') return target === 'api/crochet';
  if (target === layer) {
    if (layer === 'api/features' && featureOf(from) !== featureOf(to)) return to.endsWith('.service.ts') || typesOnly;
    if (layer === 'web/features') return featureOf(from) === featureOf(to);
    return true;
  }
  const allowed = MAY_IMPORT[layer] ?? [];
  if (target === 'api/crochet') {
    if (spec === '#crochet/shape' && allowed.includes('api/crochet/shape')) return true;
    if (!(spec in DOORS)) return false;
  }
  return allowed.includes(target) || (typesOnly && allowed.includes(`${target} types`));
}

/** Says what is wrong with one import of a file, or nothing. */
function breach(from: string, each: Import): string | null {
  const layer = layerOf(from);
  if (layer === undefined) return null;
  const to = targetOf(from, each.spec);
  const fits = to === undefined ? isAllowedPackage(layer, each) : isAllowedFile(from, layer, to, each);
  return fits ? null : `${from} -> ${each.spec}`;
}

const sources = ['api', 'web', 'migrations', 'seeds', 'storage-fake'].flatMap((dir) =>
  readdirSync(dir, { recursive: true, encoding: 'utf8' })
    .filter((file) => /\.tsx?$/.test(file) && !file.endsWith('.d.ts'))
    .map((file) => `${dir}/${file}`),
);

describe('the layers', () => {
  test('imports only go the way DEVELOPERS.md draws them', () => {
    const wrong = [...sources, 'knexfile.ts'].flatMap((file) =>
      importsOf(readFileSync(file, 'utf8'), file).flatMap((each) => breach(file, each) ?? []),
    );
    expect(wrong).toEqual([]);
  });

  test.each([
    ['api/crochet/count/a.ts', `import { z } from 'zod'`],
    ['api/crochet/count/a.ts', `import { b } from '../../contract/b.ts'`],
    ['api/contract/a.ts', `import express from 'express'`],
    ['api/platform/a.ts', `import { AppError } from '../http/problem.ts'`],
    ['api/http/a.ts', `import { openMail } from '../features/account/account.service.ts'`],
    ['api/features/marks/a.ts', `import { findPattern } from '../patterns/patterns.store.ts'`],
    ['api/features/marks/a.ts', `import knex from 'knex'`],
    ['api/features/marks/a.ts', `import { createApp } from '../../app.ts'`],
    ['api/features/marks/a.ts', `import { readLine } from '../../crochet/language/read-line.ts'`],
    ['web/features/bench/a.tsx', `import { Shelf } from '../shelf/shelf.tsx'`],
    ['web/features/bench/a.tsx', `export { x } from '../../app/bench-page.tsx'`],
    ['web/ui/a.tsx', `import { Ring } from '../parts/ring.tsx'`],
    ['web/watch/a.tsx', `import { Edition } from '#contract/editions'`],
    ['web/watch/a.tsx', `import { readLine } from '#crochet'`],
    ['web/count/a.tsx', `import { Pattern } from '#contract/patterns'`],
    ['web/parts/a.tsx', `const x = await import('../../api/platform/log.ts')`],
    ['migrations/a.ts', `import { seed } from '../seeds/index.ts'`],
  ])('in %s, %s is caught', (file, source) => {
    expect(importsOf(source).map((each) => breach(file, each))).toEqual([expect.stringContaining(file)]);
  });

  test.each([
    ['api/features/marks/a.ts', `import { findPattern } from '../patterns/patterns.service.ts'`],
    ['api/features/marks/a.ts', `import type { Knex } from 'knex'`],
    ['api/features/marks/a.ts', `import { type Knex } from 'knex'`],
    ['web/watch/a.tsx', `import type { Edition } from '#contract/editions'`],
    ['web/watch/a.tsx', `import { ringMap } from '#crochet/shape'`],
  ])('in %s, %s is free', (file, source) => {
    expect(importsOf(source).map((each) => breach(file, each))).toEqual([null]);
  });
});
