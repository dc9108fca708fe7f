/** The layer rule: who may import whom, and why. */
import { describe, expect, test } from 'vitest';
import { importsOf, sourceFiles } from '#tests/support/source-files.ts';

const SHARED_ORDER = [
  'numeric',
  'statistics',
  'units',
  'uncertainty',
  'formatting',
  'physics',
  'expressions',
  'fitting',
  'dynamics',
  'evidence',
  'claims',
  'report',
  'notes',
  'editions',
  'leaks',
  'talk',
  'contracts',
];

interface Edge {
  readonly from: string;
  readonly to: string;
}

const edges: Edge[] = sourceFiles('src', 'server', 'shared').flatMap((from) =>
  importsOf(from).map((to) => ({ from, to })),
);

const folder = (path: string, depth: number) => path.split('/').slice(0, depth).join('/');
const show = ({ from, to }: Edge) => `${from} → ${to}`;
const forbidden = (rule: (edge: Edge) => boolean) => edges.filter(rule).map(show);

describe('layers', () => {
  test('shared, when it imports, stays in shared: the same code must run in browser, server and export', () => {
    expect(
      forbidden(({ from, to }) => from.startsWith('shared/') && /^(src|server|tests)\//.test(to)),
    ).toEqual([]);
  });

  test('shared, when it imports a package, never takes one of Node or the browser', () => {
    const unfit = /^(node:|fs$|path$|react|express|sequelize|pdfkit)/;
    expect(forbidden(({ from, to }) => from.startsWith('shared/') && unfit.test(to))).toEqual([]);
  });

  test('folders of shared import only those before them, so that the numbers know nothing of the product', () => {
    // evaluate() makes the verdicts, and a verdict reads findings: file by file there is no cycle between the two.
    const rank = (path: string) =>
      SHARED_ORDER.indexOf(path.split('/')[1]?.replace('claims', 'evidence') ?? '');
    expect(
      forbidden(
        ({ from, to }) => from.startsWith('shared/') && to.startsWith('shared/') && rank(to) > rank(from),
      ),
    ).toEqual([]);
  });

  test('every folder of shared has its place in the order', () => {
    const unknown = sourceFiles('shared').filter((path) => !SHARED_ORDER.includes(path.split('/')[1] ?? ''));
    expect(unknown).toEqual([]);
  });

  test('src and server never import each other: what both need is in shared', () => {
    expect(
      forbidden(
        ({ from, to }) =>
          (from.startsWith('src/') && to.startsWith('server/')) ||
          (from.startsWith('server/') && to.startsWith('src/')),
      ),
    ).toEqual([]);
  });

  test('a client feature imports no other feature: a screen that needs two lives in src/app', () => {
    expect(
      forbidden(
        ({ from, to }) =>
          from.startsWith('src/features/') &&
          (to.startsWith('src/app/') ||
            (to.startsWith('src/features/') && folder(to, 3) !== folder(from, 3))),
      ),
    ).toEqual([]);
  });

  test('components and lib know no feature and no screen', () => {
    expect(
      forbidden(
        ({ from, to }) => /^src\/(components|lib|workers)\//.test(from) && /^src\/(features|app)\//.test(to),
      ),
    ).toEqual([]);
  });

  test('a server feature calls another only through its service', () => {
    expect(
      forbidden(
        ({ from, to }) =>
          from.startsWith('server/features/') &&
          to.startsWith('server/features/') &&
          folder(from, 3) !== folder(to, 3) &&
          !to.endsWith('/service.ts'),
      ),
    ).toEqual([]);
  });

  test('routes know no SQL, and services no requests', () => {
    expect(forbidden(({ from, to }) => from.endsWith('/routes.ts') && to === 'sequelize')).toEqual([]);
    expect(forbidden(({ from, to }) => from.endsWith('service.ts') && to === 'express')).toEqual([]);
  });
});
