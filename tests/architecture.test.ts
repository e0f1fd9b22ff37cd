/**
 * The layering as rules that run: who may import whom, what has no place here, and what to do about it. The table is the one of
 * DEVELOPERS.md, 'Where things are'; the limit on length is a house rule (200 lines are meant, 300 are refused).
 */
import { readdirSync, readFileSync } from 'node:fs';
import { join, posix, relative, sep } from 'node:path';

const root = join(__dirname, '..');
const folders = ['app', 'components', 'server', 'workers', 'recon', 'db', 'tests'];
const sourceFiles = folders.flatMap(filesOf);
const project = sourceFiles.filter((file) => !file.startsWith('tests/'));

/** A layer: the files it has, and what they may import. Of two layers that a file fits, the first counts. */
interface Layer {
  readonly name: string;
  readonly has: RegExp;
  /** Folders of the project besides its own. */
  readonly imports: readonly RegExp[];
  /** Folders of which it may import types, and nothing that runs. */
  readonly typesOf?: readonly RegExp[];
  readonly packages: RegExp;
  /** What the author of a wrong import should do. */
  readonly advice: string;
}

const anyPackage = /./;
const layers: readonly Layer[] = [
  {
    name: 'recon',
    has: /^recon\//,
    imports: [],
    packages: /^(ndarray|ndarray-ops|fft-js|pure-rand|cephes|zod)(\/|$)/,
    advice: 'The science knows no web, no clock and no database: pass what it needs as an argument.',
  },
  {
    name: 'server/contract',
    has: /^server\/contract\//,
    imports: [],
    typesOf: [/^recon\//],
    packages: /^zod$/,
    advice: 'The contract is zod and types only, because the client imports it: put what runs into server/services.',
  },
  {
    name: 'server/set-up',
    has: /^server\/(set-up\/|start\.mjs$|dev\.mjs$)/,
    imports: [/^db\/cluster\.mjs$/],
    packages: /^(node:|esbuild$)/,
    advice: 'The start script runs before any package is installed: use node: only (esbuild by a late import()).',
  },
  {
    name: 'workers',
    has: /^workers\//,
    // The thread that listens for scanners is a worker, and what it speaks is kept with the push.
    imports: [/^recon\//, /^server\/dicom\//, /^server\/mrd\//, /^server\/push\/node\//],
    typesOf: [/^server\/contract\//],
    packages: /^(node:|piscina$|fast-png$|ndarray)/,
    advice: 'A worker parses a message, calls recon or the DICOM reader and hands buffers back: HTTP and the database stay outside.',
  },
  {
    name: 'db',
    has: /^db\//,
    imports: [/^server\/set-up\/run-command\.mjs$/],
    typesOf: [/^recon\//, /^server\/contract\//],
    packages: /^(node:|drizzle-orm(\/|$)|postgres$)/,
    advice: 'The database knows tables and queries: what decides about them belongs into server/services.',
  },
  {
    name: 'server',
    has: /^server\//,
    imports: [/^db\//, /^workers\//, /^recon\//],
    packages: anyPackage,
    advice: 'The server never imports the client: move what both need into server/contract.',
  },
  {
    name: 'components',
    has: /^components\//,
    imports: [/^server\/contract\//, /^assets\//],
    typesOf: [/^recon\//],
    packages: /^(?!node:|express|drizzle-orm|postgres$|piscina)/,
    advice: 'The client asks the server: call a route through components/api, or take a type from server/contract.',
  },
  {
    name: 'app',
    has: /^app\//,
    imports: [/^components\//],
    packages: /^(react$|expo-router$|expo-font$|@tanstack\/react-query$|@expo-google-fonts\/)/,
    advice: 'A route is a table of contents: move what it does into a component and render that.',
  },
];

interface Import {
  readonly from: string;
  /** A path of the project, or the name of a package. */
  readonly to: string;
  readonly isPackage: boolean;
  readonly typeOnly: boolean;
}

function filesOf(folder: string): string[] {
  return readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(tsx?|mjs)$/.test(entry.name))
    .map((entry) => relative(root, join(entry.parentPath, entry.name)).split(sep).join('/'));
}

const read = (file: string): string => readFileSync(join(root, file), 'utf8');

/** Comments say `import` too, and quote what the rules forbid. */
const withoutComments = (text: string): string => text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/^\s*\/\/.*$/gm, '');

/** What is said in words is no type. */
const withoutStrings = (text: string): string => text.replace(/'(?:\\.|[^'\\\n])*'|"[^"\n]*"|`[^`]*`/g, "''");

/** The imports of a source text: `import … from`, `export … from`, bare `import '…'`, and `import('…')`. */
function importsOf(from: string, text: string): Import[] {
  const statement = /\b(?:import|export)\s+(type\s+)?(?:([\w*{][^'";]*?)\s+from\s+)?'([^']+)'|\bimport\(\s*'([^']+)'/g;
  return [...withoutComments(text).matchAll(statement)].map(([, typeKeyword, names = '', specifier, late]) => {
    const target = specifier ?? late ?? '';
    const isPackage = !target.startsWith('.') && !target.startsWith('@/');
    return {
      from,
      to: target.startsWith('.') ? posix.join(posix.dirname(from), target) : target.replace(/^@\//, ''),
      isPackage,
      typeOnly: typeKeyword !== undefined || bringsTypesOnly(names),
    };
  });
}

/** `{ type A, type B }` runs nothing either. */
function bringsTypesOnly(names: string): boolean {
  const parts = /^\{(.*)\}$/s.exec(names.trim())?.[1]?.split(',');
  return parts !== undefined && parts.filter((part) => part.trim() !== '').every((part) => /^\s*type\s/.test(part));
}

/** What is wrong with an import, as a sentence; undefined when nothing is. */
function faultOf({ from, to, isPackage, typeOnly }: Import): string | undefined {
  const layer = layers.find(({ has }) => has.test(from));
  if (layer === undefined) return `${from} belongs to no layer: put it into a folder of the table in DEVELOPERS.md.`;
  const allowed = isPackage ? layer.packages.test(to) : mayImport(layer, to, typeOnly);
  return allowed ? undefined : `${from} imports ${to}, which ${layer.name} must not. ${layer.advice}`;
}

function mayImport(layer: Layer, to: string, typeOnly: boolean): boolean {
  const inside = layers.find(({ has }) => has.test(to) || has.test(`${to}/`)) === layer;
  const matches = (pattern: RegExp) => pattern.test(to);
  // The whole server may use its own contract; the other way round is the contract's rule.
  const ownContract = layer.name === 'server' && /^server\/contract\//.test(to);
  return inside || ownContract || layer.imports.some(matches) || (typeOnly && (layer.typesOf ?? []).some(matches));
}

const faultsIn = (text: string, from: string): string[] => importsOf(from, text).flatMap((one) => faultOf(one) ?? []);

describe('who may import whom', () => {
  test('every import of the project stays within its layer', () => {
    expect(project.length).toBeGreaterThan(50);
    expect(project.flatMap((file) => faultsIn(read(file), file))).toEqual([]);
  });

  test.each([
    ['recon/simulate.ts', "import { readFile } from 'node:fs/promises';"],
    ['recon/simulate.ts', "import { route } from '../server/contract/route';"],
    ['server/contract/recipe.ts', "import { causes } from '../../recon/causes/index';"],
    ['workers/job.ts', "import { openDatabase } from '../db/client';"],
    ['db/client.ts', "import { createApp } from '../server/app';"],
    ['server/app.ts', "import { Button } from '../components/ui/button';"],
    ['components/bench/pane.tsx', "import { simulate } from '@/recon/simulate';"],
    ['components/bench/pane.tsx', "import { type Recipe, simulate } from '@/recon/simulate';"],
    ['components/bench/pane.tsx', "const late = await import('@/server/services/health');"],
    ['app/index.tsx', "export { health } from '@/server/contract/health';"],
    ['app/index.tsx', "import 'zod';"],
    ['server/start.mjs', "import express from 'express';"],
  ])('in %s, %s is refused with advice', (from, text) => {
    expect(faultsIn(text, from)).toEqual([expect.stringMatching(/^\S+ imports \S+, which \S+ must not\. .+\.$/)]);
  });

  test.each([
    ['components/bench/pane.tsx', "import type { Recipe } from '@/recon/recipe';"],
    ['components/bench/pane.tsx', "import { type Recipe } from '@/recon/recipe';"],
    ['server/services/health.ts', "import { health } from '../contract/health';"],
    ['recon/random.ts', "import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';"],
    ['recon/grid.ts', "// import { readFile } from 'node:fs';"],
  ])('in %s, %s is allowed', (from, text) => {
    expect(faultsIn(text, from)).toEqual([]);
  });
});

describe('what has no place here', () => {
  test('recon asks neither the clock nor Math.random, so that the same seed gives the same bytes', () => {
    const recon = project.filter((file) => file.startsWith('recon/'));
    const asking = recon.filter((file) => /\bMath\.random\b|\bDate\b|\bperformance\./.test(withoutComments(read(file))));
    expect(asking).toEqual([]);
  });

  test('no file is longer than 300 lines: split it where its second idea begins', () => {
    const long = sourceFiles.map((file) => ({ file, lines: read(file).split('\n').length - 1 })).filter(({ lines }) => lines > 300);
    expect(long).toEqual([]);
  });

  const here = relative(root, __filename).split(sep).join('/');
  const others = sourceFiles.filter((file) => file !== here);

  test('no type is any: narrow from unknown', () => {
    const ways = /:\s*any\b|\bas any\b|<any>|\bany\[\]/;
    expect(others.filter((file) => ways.test(withoutStrings(withoutComments(read(file)))))).toEqual([]);
  });

  test('no rule is switched off in a comment: change the code, or the rule for everybody', () => {
    const ways = /@ts-(ignore|nocheck|expect-error)|eslint-disable|prettier-ignore|@type \{any\}/;
    expect(others.filter((file) => ways.test(read(file)))).toEqual([]);
  });

  test('no folder or file has a name that says nothing: name it after what it does', () => {
    const empty = /(^|\/)(utils?|helpers?|common|types|lib|misc)(\/|\.[a-z]+$)/;
    expect(sourceFiles.filter((file) => empty.test(file))).toEqual([]);
  });

  test('no request handler and no service computes a transform: it goes through the pool of workers', () => {
    const kernels = /^recon\/(fourier|simulate)/;
    const handlers = project.filter((file) => /^server\/(routes|services)\//.test(file));
    const computing = handlers.flatMap((file) => importsOf(file, read(file)).filter(({ to, typeOnly }) => kernels.test(to) && !typeOnly));
    expect(computing).toEqual([]);
  });
});
