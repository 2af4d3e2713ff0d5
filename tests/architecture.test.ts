import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

const root = path.resolve(import.meta.dirname, '..');
const unversioned = [
  '.git',
  'node_modules',
  '.next',
  '.data',
  'test-results',
  'playwright-report',
  'pictures',
];

const topLevel = {
  folders: ['.ci', 'app', 'db', 'docs', 'e2e', 'fonts', 'migrations', 'public', 'scripts', 'src', 'tests'],
  files: [
    'DEVELOPERS.md',
    'README.md',
    'drizzle.config.ts',
    'eslint.config.mjs',
    'instrumentation.ts',
    'next-env.d.ts',
    'next.config.mjs',
    'package-lock.json',
    'package.json',
    'playwright.config.ts',
    'postcss.config.mjs',
    'proxy.ts',
    'tailwind.config.ts',
    'tsconfig.json',
    'vitest.config.ts',
  ],
};

type SourceFile = { file: string; text: string };

const files = walk('.');
const texts: SourceFile[] = files
  .filter((file) => /\.(tsx?|mts|mjs|cjs|json|md|css|sql|svg|ya?ml)$|^\.ci\/|^\.npmrc$/.test(file))
  .map((file) => ({ file, text: readFileSync(path.join(root, file), 'utf8') }));
const code = texts.filter(({ file }) => /\.(tsx?|mts|mjs|cjs)$/.test(file) && !file.endsWith('.d.ts'));
const shipped = code.filter(({ file }) => /^(app|src|db)\/|^(proxy|instrumentation)\.ts$/.test(file));

describe('the ground plan', () => {
  it('has the top level of the house and nothing else', () => {
    const entries = readdirSync(root, { withFileTypes: true }).filter(
      ({ name }) => !unversioned.includes(name),
    );
    const folders = entries.filter((entry) => entry.isDirectory()).map(({ name }) => name);
    const plain = entries.filter((entry) => !entry.isDirectory() && !entry.name.startsWith('.'));
    expect(folders.filter((name) => !topLevel.folders.includes(name))).toEqual([]);
    expect(topLevel.folders.filter((name) => !folders.includes(name))).toEqual([]);
    const strays = plain.map(({ name }) => name).filter((name) => !/\.tsbuildinfo$/.test(name));
    expect(strays.filter((name) => !topLevel.files.includes(name))).toEqual([]);
  });

  it('has no folder without a noun', () => {
    const nameless = /(^|\/)_?(lib|libs|util|utils|helpers|common|shared|misc|types)\//;
    expect(files.filter((file) => nameless.test(file) && !file.startsWith('tests/helpers/'))).toEqual([]);
  });

  it('has the layers of the house below src', () => {
    const known = 'units sky array clock schedule outlook exchange access data viewer mail'.split(' ');
    const folders = readdirSync(path.join(root, 'src'), { withFileTypes: true }).filter((e) =>
      e.isDirectory(),
    );
    expect(folders.map(({ name }) => name).filter((name) => !known.includes(name))).toEqual([]);
  });

  it('names files in kebab-case', () => {
    const named = files.filter((file) => /^(app|src|db|e2e|tests|scripts)\/.*\.(tsx?|mts|mjs)$/.test(file));
    const odd = named.filter(
      (file) => !/^[a-z0-9-]+(\.(test|spec|d|worker))?\.(tsx?|mts|mjs)$/.test(path.basename(file)),
    );
    expect(odd).toEqual([]);
  });
});

describe('a file', () => {
  it('is no barrel', () => {
    const passedOn =
      /^\s*(export\s+(type\s+)?\{[^}]*\}\s*from\s.*|import\s[^;]*;|\/\/.*|['"]use \w+['"];?)$/gm;
    const isBarrel = (text: string) => /^export\s+\*/m.test(text) || text.replace(passedOn, '').trim() === '';
    const withText = code.filter(({ text }) => text.trim() !== '');
    expect(withText.filter(({ text }) => isBarrel(text)).map(({ file }) => file)).toEqual([]);
    expect(files.filter((file) => /^(app|src|db)\/.*\/index\.tsx?$/.test(file))).toEqual([]);
  });

  it('stays within 400 lines, data exempt', () => {
    const data = /^(db\/seed-data|tests\/reference|migrations)\//;
    const measured = texts.filter(({ file }) => file !== 'package-lock.json' && !data.test(file));
    const long = measured.filter(({ text }) => text.trimEnd().split('\n').length > 400);
    expect(long.map(({ file }) => file)).toEqual([]);
  });

  it('holds no promise for later and no hushed rule', () => {
    const hushed = new RegExp(
      ['TO' + 'DO', 'FIX' + 'ME', '@ts-' + 'ignore', '@ts-' + 'nocheck', 'as ' + 'any\\b'].join('|'),
    );
    expect(code.filter(({ text }) => hushed.test(text)).map(({ file }) => file)).toEqual([]);
  });

  it('names no package registry', () => {
    const registry = new RegExp(
      ['registry\\.[a-z]+js', 'npm' + 'js\\.(org|com)', 'yarn' + 'pkg\\.com'].join('|'),
      'i',
    );
    expect(texts.filter(({ text }) => registry.test(text)).map(({ file }) => file)).toEqual([]);
  });
});

describe('the lock file', () => {
  const lock = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')) as {
    packages: Record<string, { resolved?: string; integrity?: string; link?: boolean }>;
  };
  const locked = Object.entries(lock.packages).filter(([place]) => place !== '');

  it('says of every package what it is, and not where it came from', () => {
    expect(locked.length).toBeGreaterThan(100);
    expect(locked.filter(([, { resolved }]) => resolved !== undefined).map(([place]) => place)).toEqual([]);
    expect(locked.filter(([, { integrity }]) => !integrity).map(([place]) => place)).toEqual([]);
  });

  it('goes with exact versions in package.json', () => {
    const project = JSON.parse(readFileSync(path.join(root, 'package.json'), 'utf8')) as {
      dependencies: Record<string, string>;
      devDependencies: Record<string, string>;
    };
    const wanted = Object.entries({ ...project.dependencies, ...project.devDependencies });
    expect(wanted.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([]);
  });
});

describe('one door each', () => {
  const importers = (name: RegExp) =>
    code.filter(({ text }) => importsOf(text).some((from) => name.test(from)));

  it('the environment is read in src/env.ts only', () => {
    const reads = /process\.env(?!\.(NODE_ENV|NEXT_RUNTIME)\b)/;
    expect(shipped.filter(({ text }) => reads.test(text)).map(({ file }) => file)).toEqual(['src/env.ts']);
  });

  it('astronomy-engine is imported by src/sky/engine.ts only, and by what benchmarks measure against', () => {
    const found = importers(/^astronomy-engine$/).map(({ file }) => file);
    expect(found.filter((file) => !file.startsWith('scripts/bench/peers/'))).toEqual(['src/sky/engine.ts']);
  });

  it('Lucia is imported inside src/viewer only', () => {
    const found = importers(/^(lucia|@lucia-auth\/)/).map(({ file }) => file);
    expect(found.length).toBeGreaterThan(0);
    expect(found.filter((file) => !file.startsWith('src/viewer/'))).toEqual([]);
  });

  it('the database is opened in db only', () => {
    const found = importers(/^@libsql\/client$/).map(({ file }) => file);
    expect(found.filter((file) => !/^(db|tests|scripts)\//.test(file))).toEqual([]);
  });
});

describe('a decision on record', () => {
  const decisions = texts.filter(({ file }) => file.startsWith('docs/decisions/'));

  it.each(decisions)(
    '$file says context, decision and consequence, and which test holds it',
    ({ file, text }) => {
      expect(path.basename(file)).toMatch(/^\d{4}-[a-z0-9-]+\.md$/);
      for (const head of ['Context', 'Decision', 'Consequence', 'Held by'])
        expect(text).toContain(`\n## ${head}\n`);
      const held = text.slice(text.indexOf('## Held by')).match(/`((?:tests|e2e|scripts)\/[^`]+)`/g) ?? [];
      expect(held.length).toBeGreaterThan(0);
      for (const quoted of held) expect(existsSync(path.join(root, quoted.slice(1, -1))), quoted).toBe(true);
    },
  );

  it('has a number of its own', () => {
    const numbers = decisions.map(({ file }) => path.basename(file).slice(0, 4));
    expect(numbers.length).toBeGreaterThan(0);
    expect(new Set(numbers).size).toBe(numbers.length);
  });
});

function walk(folder: string): string[] {
  return readdirSync(path.join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const place = folder === '.' ? entry.name : `${folder}/${entry.name}`;
    if (folder === '.' && unversioned.includes(entry.name)) return [];
    return entry.isDirectory() ? walk(place) : [place];
  });
}

function importsOf(text: string): string[] {
  return [...text.matchAll(/(?:from|import)\s*\(?\s*['"]([^'"]+)['"]/g)].map((match) => match[1] ?? '');
}
