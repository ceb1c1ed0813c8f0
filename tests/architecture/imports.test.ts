/** Who may import whom (DEVELOPERS.md). The rule is the folder; a change of rule is a decision to write down. */
import { readFileSync, readdirSync } from 'node:fs';
import { dirname, join, relative, resolve } from 'node:path';
import { describe, expect, it } from 'vitest';

const root = resolve(import.meta.dirname, '../..');
const TOPS = ['src', 'server', 'shared', 'workers'] as const;

function sourcesBelow(folder: string): string[] {
  return readdirSync(join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    const path = `${folder}/${entry.name}`;
    if (entry.isDirectory()) return sourcesBelow(path);
    return /\.tsx?$/.test(entry.name) && !/\.test\.tsx?$/.test(entry.name) ? [path] : [];
  });
}

/** Imports as the compiler sees them: static, re-export, dynamic and worker URLs; comments left out. */
function importsOf(file: string): string[] {
  const text = readFileSync(join(root, file), 'utf8').replace(/\/\*[\s\S]*?\*\/|(^|\s)\/\/.*$/gm, '$1');
  const found = text.matchAll(
    /(?:^|\s)(?:import|export)\s[^'";]*?from\s*['"]([^'"]+)['"]|(?:^|\s)import\s*['"]([^'"]+)['"]|import\(\s*['"]([^'"]+)['"]\s*\)|new URL\(\s*['"]([^'"]+)['"]/g,
  );
  return [...found].map((match) => match[1] ?? match[2] ?? match[3] ?? match[4] ?? '');
}

/** True when every import of this specifier begins with `import type`. */
function importsOnlyTypes(file: string, specifier: string): boolean {
  const text = readFileSync(join(root, file), 'utf8');
  const all = [...text.matchAll(/(?:^|\s)(import|export)\s+(type\s)?[^'";]*?from\s*['"]([^'"]+)['"]/g)];
  const ofThis = all.filter((match) => match[3] === specifier);
  return ofThis.length > 0 && ofThis.every((match) => match[2] !== undefined);
}

/** Repository path of an import of our own, or null for a package. */
function ownPath(file: string, specifier: string): string | null {
  if (specifier.startsWith('#')) return specifier.slice(1).replace(/\?.*$/, '');
  if (specifier.startsWith('.'))
    return relative(root, resolve(root, dirname(file), specifier.replace(/\?.*$/, ''))).replaceAll('\\', '/');
  return null;
}

type Rule = {
  readonly about: string;
  readonly from: RegExp;
  /** Own files that may be imported; packages are judged by `packages`. */
  readonly may: RegExp;
  readonly packages?: RegExp;
  /** Own files whose types alone may be imported: erased, nothing of them runs. */
  readonly types?: RegExp;
};

const RULES: readonly Rule[] = [
  {
    about: 'the domain knows only itself',
    from: /^shared\/domain\//,
    may: /^shared\/domain\//,
    packages: /^(fraction\.js|papaparse)$/,
  },
  {
    about: 'schemas know the domain and zod',
    from: /^shared\/schemas\//,
    may: /^shared\//,
    packages: /^zod$/,
  },
  {
    about: 'the solver core knows the domain',
    from: /^workers\/solver\/core\//,
    may: /^(shared\/domain|workers\/solver)\//,
    packages: /^highs$/,
  },
  { about: 'workers never reach server or pages', from: /^workers\//, may: /^(shared|workers)\// },
  {
    about: 'components know no product',
    from: /^src\/components\//,
    may: /^(src\/components|shared\/domain)\//,
  },
  { about: 'lib is below the features', from: /^src\/lib\//, may: /^(src\/lib|shared|workers)\// },
  { about: 'nothing under src imports server', from: /^src\//, may: /^(src|shared|workers)\// },
  {
    about: 'nothing under server imports src',
    from: /^server\//,
    may: /^((server|shared|workers)\/|package\.json$)/,
  },
  {
    about: 'policies are pure',
    from: /^server\/policies\//,
    may: /^(server\/policies\/|server\/errors|shared\/)/,
  },
  {
    about: 'presenters are pure',
    from: /^server\/presenters\//,
    may: /^(server\/presenters|server\/policies|shared)\//,
    types: /^server\/(models|services)\//,
  },
  {
    about: 'routes go through services',
    from: /^server\/routes\//,
    may: /^(server\/(routes|middleware|policies|services|presenters)\/|server\/(errors|config)|shared\/)/,
  },
  {
    about: 'services never see a request',
    from: /^server\/services\//,
    may: /^(server\/(services|models|emails|documents|policies)\/|server\/(database|errors|config|log)|shared\/|workers\/)/,
  },
];

describe('import rules', () => {
  const files = TOPS.flatMap((top) => sourcesBelow(top));

  it('finds the sources', () => {
    expect(files.length).toBeGreaterThan(100);
  });

  it.each(RULES)('$about', ({ from, may, packages, types }) => {
    const broken = files
      .filter((file) => from.test(file))
      .flatMap((file) =>
        importsOf(file)
          .map((specifier) => ({ specifier, own: ownPath(file, specifier) }))
          .filter(({ specifier, own }) =>
            own === null ? (packages ? !packages.test(specifier) : false) : !may.test(own),
          )
          .filter(({ specifier, own }) => !(own && types?.test(own) && importsOnlyTypes(file, specifier)))
          .map(({ specifier }) => `${file} imports ${specifier}`),
      );
    expect(broken).toEqual([]);
  });

  it('a feature imports no other feature', () => {
    const featureOf = (path: string) => /^src\/features\/([^/]+)\//.exec(path)?.[1];
    const broken = files.flatMap((file) => {
      const feature = featureOf(file);
      if (!feature) return [];
      return importsOf(file).flatMap((specifier) => {
        const own = ownPath(file, specifier);
        if (own === null) return [];
        const other = featureOf(own);
        return (other && other !== feature) || own.startsWith('src/routes/')
          ? [`${file} imports ${specifier}`]
          : [];
      });
    });
    expect(broken).toEqual([]);
  });

  it('services never touch req or res', () => {
    const broken = files
      .filter((file) => file.startsWith('server/services/') || file.startsWith('server/presenters/'))
      .filter((file) => importsOf(file).includes('express'));
    expect(broken).toEqual([]);
  });

  it('there are no barrels but the solver core, the models, the migrations and the route list', () => {
    const allowed = [
      'workers/solver/core/index.ts',
      'server/models/index.ts',
      'server/migrations/index.ts',
      'server/routes/index.ts',
    ];
    expect(files.filter((file) => /\/index\.tsx?$/.test(file) && !allowed.includes(file))).toEqual([]);
  });
});

describe('house rules', () => {
  const top = readdirSync(root);

  it('the top level holds what it must and nothing else', () => {
    const fixed = [
      'README.md',
      'DEVELOPERS.md',
      'package.json',
      'tsconfig.json',
      'vite.config.ts',
      'tailwind.config.ts',
      'index.html',
      'src',
      'server',
      'shared',
      'workers',
      'tests',
      'fixtures',
    ];
    const tools = ['package-lock.json', 'eslint.config.js'];
    const made = ['node_modules', 'dist', 'data'];
    expect(fixed.filter((name) => !top.includes(name))).toEqual([]);
    expect(
      top.filter((name) => !name.startsWith('.') && ![...fixed, ...tools, ...made].includes(name)),
    ).toEqual([]);
  });

  it('names no package registry and nothing is fetched from elsewhere at run time', () => {
    const files = [...TOPS.flatMap((folder) => sourcesBelow(folder)), 'index.html'];
    const outside = files.filter((file) =>
      [...readFileSync(join(root, file), 'utf8').matchAll(/https?:\/\/([a-z0-9.-]+)/gi)].some(
        ([, host]) => !/^(localhost|127\.0\.0\.1|www\.w3\.org|[a-z0-9.-]+\.example)$/i.test(host ?? ''),
      ),
    );
    expect(outside).toEqual([]);
  });
});
