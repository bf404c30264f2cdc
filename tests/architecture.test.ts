import { readdirSync, readFileSync, statSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const ROOT = fileURLToPath(new URL('..', import.meta.url));

/** Source files below a folder, as paths from the project's root. */
function filesBelow(folder: string): string[] {
  return readdirSync(`${ROOT}${folder}`).flatMap((name) => {
    const path = `${folder}/${name}`;
    if (statSync(ROOT + path).isDirectory()) return filesBelow(path);
    return /\.(ts|tsx|mts)$/.test(name) ? [path] : [];
  });
}

const read = (path: string) => readFileSync(ROOT + path, 'utf8');
const screens = [...filesBelow('app'), ...filesBelow('components'), ...filesBelow('lib')];

describe('addresses', () => {
  it('come from lib/routes.ts only', () => {
    const handWritten = screens
      .filter((path) => path !== 'lib/routes.ts')
      .flatMap((path) =>
        [
          ...read(path).matchAll(/(href=|href: |push\(|replace\(|redirect\()\{?["'`]\/[^"'`]*/g),
        ].map(([text]) => `${path}: ${text}`),
      );
    expect(handWritten).toEqual([]);
  });
});

describe('server code', () => {
  it('never reaches the browser: its first import is server-only', () => {
    const open = filesBelow('lib/server').filter((path) => {
      const code = read(path).replace(/^(\s*(\/\/.*|\/\*[\s\S]*?\*\/)\s*)*/, '');
      return !code.startsWith("import 'server-only';");
    });
    expect(open).toEqual([]);
  });
});

describe('queries and commands', () => {
  const made = [...filesBelow('lib/server/queries'), ...filesBelow('lib/server/commands')].flatMap(
    (path) =>
      [...read(path).matchAll(/export const (\w+)(?::[^=]+)? = (\w+)[(<]/g)].map(
        ([, name = '', maker = '']) => ({ path, name, maker }),
      ),
  );

  it('are made by query() and command(), which demand a permission', () => {
    const others = made.filter(({ maker }) => maker !== 'query' && maker !== 'command');
    expect(others).toEqual([]);
    expect(made.length).toBeGreaterThan(20);
  });

  it('carry their own name where they write the audit', () => {
    const misnamed = made
      .filter(({ maker }) => maker === 'command')
      .filter(({ path, name }) => !read(path).includes(`name: '${name}'`));
    expect(misnamed).toEqual([]);
  });

  it('are each run by an actor of another site', () => {
    const cases = filesBelow('tests/server/other-site')
      .flatMap((path) => [...read(path).matchAll(/name: '(\w+)'/g)])
      .map(([, name]) => name);
    const untested = made.map(({ name }) => name).filter((name) => !cases.includes(name));
    expect(untested).toEqual([]);
  });
});

describe('names', () => {
  it('say what a file is for', () => {
    const drawers = [...screens, ...filesBelow('entities'), ...filesBelow('seeders')].filter(
      (path) => /(^|\/)(utils?|helpers?|misc|common|index)\.(ts|tsx)$/.test(path),
    );
    expect(drawers).toEqual([]);
  });
});

describe('docs/formulas.md', () => {
  const listed = [
    ...read('docs/formulas.md').matchAll(/\| `(lib\/domain\/[\w/-]+\.ts)`\s*\| `(\w+)`\s*\|/g),
  ].map(([, path = '', name = '']) => ({ path, name }));

  it('names functions that exist', () => {
    const gone = listed.filter(({ path, name }) => {
      try {
        return !new RegExp(`export (function|const) ${name}\\b`).test(read(path));
      } catch {
        return true;
      }
    });
    expect(gone).toEqual([]);
    expect(listed.length).toBeGreaterThan(30);
  });

  it('leaves out no file of arithmetic that cites a source', () => {
    const topics = ['balancing', 'signal', 'severity', 'trends', 'due'];
    const cited = topics
      .flatMap((topic) => filesBelow(`lib/domain/${topic}`))
      .filter((path) => /Source:/.test(read(path)));
    const missing = cited.filter((path) => !listed.some((line) => line.path === path));
    expect(missing).toEqual([]);
  });
});
