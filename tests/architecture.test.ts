import { readdirSync, readFileSync } from 'node:fs';
import { basename, dirname, join, normalize } from 'node:path';
import { describe, expect, test } from 'vitest';

interface SourceFile {
  path: string;
  text: string;
  /** relative imports as paths from the root, others as they are written */
  imports: string[];
}

const IMPORT = /^(?:import|export)\s[^;'"]*?from '([^']+)'|^import '([^']+)'|\bimport\('([^']+)'\)/gm;

const sources: SourceFile[] = ['inversion', 'server', 'src', 'migrations', 'scripts'].flatMap((area) =>
  readdirSync(area, { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.(ts|tsx|mjs)$/.test(name))
    .map((name) => read(join(area, name))),
);

function read(path: string): SourceFile {
  const text = readFileSync(path, 'utf8');
  const imports = [...text.matchAll(IMPORT)].map(([, ...groups]) => {
    const target = groups.find((group) => group !== undefined) ?? '';
    return target.startsWith('.') ? normalize(join(dirname(path), target)) : target;
  });
  return { path, text, imports };
}

/** `area: names of files` for every file of a place that breaks a rule; the empty list is what is wanted. */
const breaking = (place: RegExp, breaks: (file: SourceFile) => string[]): string[] =>
  sources
    .filter((file) => place.test(file.path))
    .flatMap((file) => breaks(file).map((what) => `${file.path}: ${what}`));

const importsOtherThan = (allowed: RegExp) => (file: SourceFile) =>
  file.imports.filter((target) => !allowed.test(target));

const importsOf = (refused: RegExp) => (file: SourceFile) =>
  file.imports.filter((target) => refused.test(target));

const matches = (pattern: RegExp) => (file: SourceFile) => file.text.match(pattern) ?? [];

test('the sources are found at all', () => {
  expect(sources.length).toBeGreaterThan(150);
  expect(sources.find((file) => file.path === 'server/app.ts')?.imports).toContain('server/endpoints');
});

describe('imports point one way', () => {
  test('inversion sees itself and its numeric packages', () => {
    expect(breaking(/^inversion\//, importsOtherThan(/^(inversion\/|ml-|pure-rand\b)/))).toEqual([]);
  });

  test('the contract sees inversion and zod', () => {
    expect(
      breaking(/^server\/contract\//, importsOtherThan(/^(inversion(\/|$)|server\/contract\/|zod$)/)),
    ).toEqual([]);
  });

  test('the server does not see the client, tests or scripts', () => {
    expect(breaking(/^server\//, importsOf(/^(src|tests|scripts)\//))).toEqual([]);
  });

  test('the client sees of the server its contract alone, and no Node', () => {
    expect(breaking(/^src\//, importsOf(/^(server\/(?!contract\/)|node:|migrations|scripts|tests)/))).toEqual(
      [],
    );
  });

  test('no file writes the extension of a relative import', () => {
    expect(
      breaking(/\.tsx?$/, importsOf(/^(inversion|server|src|migrations|scripts)\/.*\.(ts|tsx|js)$/)),
    ).toEqual([]);
  });
});

describe('inversion is pure', () => {
  test('no clock, chance, console, timer or process', () => {
    const impure =
      /\b(Math\.random|Date\.now|new Date|performance\.now|console\.|setTimeout|setInterval|process\.|fetch\()/g;
    expect(breaking(/^inversion\//, matches(impure))).toEqual([]);
  });

  test('only what IEEE 754 rounds one way is taken from Math; the rest stands in inversion/math', () => {
    const fixed = 'sqrt|abs|min|max|floor|round|ceil|trunc|sign|imul|fround|PI|LN2|LN10|LOG2E|LOG10E|SQRT2';
    const unfixed = new RegExp(`Math\\.(?!(?:${fixed})\\b)\\w+|(?<![/*])\\*\\*(?![/*])`, 'g');
    expect(breaking(/^inversion\//, matches(unfixed))).toEqual([]);
  });
});

describe('features stand beside each other', () => {
  /** A value travels readings → runs → interpretations, each arrow one function: what may be taken from upstream. */
  const UPSTREAM = ['server/readings/fit-readings'];
  const SHARED = ['access', 'contract', 'db', 'http', 'jobs', 'mail'];

  const sideways = (root: string, shared: readonly string[]) => (file: SourceFile) => {
    const featureOf = (path: string) => new RegExp(`^${root}/([^/]+)/`).exec(path)?.[1];
    const own = featureOf(file.path);
    return file.imports.filter((target) => {
      if (UPSTREAM.includes(target)) return false;
      const other = featureOf(target);
      return own !== undefined && other !== undefined && other !== own && !shared.includes(other);
    });
  };

  test('no feature of the server imports another', () => {
    expect(
      breaking(/^server\/(?!(access|contract|db|http|jobs|mail|demo)\/)/, sideways('server', SHARED)),
    ).toEqual([]);
  });

  test('what features share imports none of them', () => {
    const feature = new RegExp(`^server/(?!(${SHARED.join('|')})/)[^/]+/`);
    expect(breaking(/^server\/(access|contract|db|http|mail)\//, importsOf(feature))).toEqual([]);
  });

  test('no feature of the client imports another', () => {
    expect(breaking(/^src\/features\//, sideways('src/features', []))).toEqual([]);
  });

  test('what the features of the client share imports none of them', () => {
    expect(breaking(/^src\/(api|ui|charts|workers)\//, importsOf(/^src\/(features|app)\//))).toEqual([]);
  });
});

describe('each part of a request keeps to its task', () => {
  test('routes hold no SQL, no checks of roles and no try', () => {
    const refused =
      /\b(requireCan|getSurveyAccess|getSoundingAccess|\.raw\(|\.transaction\(|db\(|try \{|AppError)/g;
    expect(breaking(/-routes\.ts$/, matches(refused))).toEqual([]);
    expect(breaking(/-routes\.ts$/, importsOf(/^(knex|pg)$|-store$/))).toEqual([]);
  });

  test('services do not see the exchange', () => {
    expect(breaking(/-service\.ts$/, importsOf(/^express$/))).toEqual([]);
  });

  test('stores refuse nobody: they find, or find not', () => {
    expect(breaking(/^server\/.*-store\.ts$/, matches(/requireCan|'forbidden'/g))).toEqual([]);
  });

  test('presenters ask no database', () => {
    expect(breaking(/-presenter\.ts$/, importsOf(/^(knex|pg)$/))).toEqual([]);
  });

  test('statuses of failures are written in one place', () => {
    const status = /\.status\((4|5)\d\d\)/g;
    expect(breaking(/^server\/(?!http\/(client-pages|health)\.ts)/, matches(status))).toEqual([]);
  });
});

describe('house style', () => {
  test('file names are kebab-case', () => {
    const wrong = sources.filter(
      ({ path }) => !/^[a-z0-9-]+(\.config|\.d)?\.(ts|tsx|mjs)$/.test(basename(path)),
    );
    expect(wrong.map((file) => file.path).filter((path) => !/^migrations\/\d{14}_/.test(path))).toEqual([]);
  });

  test('no barrels: one index each for the engine and the list of migrations', () => {
    const indexes = sources.map((file) => file.path).filter((path) => /(^|\/)index\.tsx?$/.test(path));
    expect(indexes.filter((path) => !/^(inversion|migrations)\/index\.ts$/.test(path))).toEqual([]);
  });

  test('no default exports but the one that the thread pool calls', () => {
    expect(
      breaking(/^(inversion|server|src)\/(?!jobs\/fit-thread)/, matches(/^export default\b.*$/gm)),
    ).toEqual([]);
  });

  test('nothing is switched off or left for later', () => {
    const refused = /@ts-ignore|@ts-expect-error|@ts-nocheck|(?:ox|es)lint-disable|\bTODO\b|\bFIXME\b/g;
    expect(breaking(/./, matches(refused))).toEqual([]);
  });

  test('no file runs past 400 lines', () => {
    expect(breaking(/./, (file) => (file.text.split('\n').length > 400 ? ['too long'] : []))).toEqual([]);
  });
});
