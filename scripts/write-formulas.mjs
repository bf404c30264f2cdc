import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { ROOT } from './lib/places.mjs';

const TOPICS = [
  'balancing',
  'balance-job',
  'signal',
  'severity',
  'trends',
  'due',
  'intake',
  'drawing',
];
const FILE = `${ROOT}docs/formulas.md`;
const MARK = '<!-- what follows is written by scripts/write-formulas.mjs from the code -->';

/** Rewrites the tables of docs/formulas.md from what the functions say of themselves. */
const head = readFileSync(FILE, 'utf8').split(MARK)[0];
const tables = TOPICS.map((topic) => {
  const rows = readdirSync(`${ROOT}lib/domain/${topic}`)
    .filter((name) => name.endsWith('.ts'))
    .sort()
    .flatMap((name) => rowsOf(`lib/domain/${topic}/${name}`));
  if (rows.length === 0) return '';
  return `## ${topic}\n\n| file | function | what it computes | source |\n|---|---|---|---|\n${rows.join('\n')}\n`;
});
writeFileSync(FILE, `${head}${MARK}\n\n${tables.filter(Boolean).join('\n')}`);

function rowsOf(path) {
  const code = readFileSync(`${ROOT}${path}`, 'utf8');
  const documented = /\/\*\*((?:(?!\*\/)[\s\S])*)\*\/\s*export function (\w+)/g;
  return [...code.matchAll(documented)].flatMap(([, comment, name]) => {
    const text = comment
      .replace(/^\s*\*?\s?/gm, ' ')
      .replace(/\s+/g, ' ')
      .trim();
    const source = /Source: (.*?)(?= @\w| Example:|$)/.exec(text)?.[1];
    const what = text.split(/ (?=@\w|Source:|Example:)/)[0];
    return `| \`${path}\` | \`${name}\` | ${cell(what)} | ${cell(source ?? 'definition, in the text')} |`;
  });
}

function cell(text) {
  return text.trim().replaceAll('|', '\\|');
}
