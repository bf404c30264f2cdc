import 'server-only';

type Node = { [key: string]: Node | FormDataEntryValue | FormDataEntryValue[] };

/**
 * A form as nested plain data: `vectors.0.lag` becomes `{ vectors: [{ lag }] }`, a repeated name
 * becomes an array, React's own `$ACTION…` fields are left out.
 */
export function formToInput(form: FormData): unknown {
  const root: Node = {};
  for (const name of new Set(form.keys())) {
    if (name.startsWith('$ACTION')) continue;
    const all = form.getAll(name);
    place(root, name.split('.'), all.length > 1 ? all : (all[0] ?? ''));
  }
  return arraysWhereNumbered(root);
}

/**
 * Every text of the form by its name, to show again after a failure: several of one name stand in lines. A
 * password is never sent back.
 */
export function typedValues(form: FormData): Record<string, string> {
  const values: Record<string, string> = {};
  for (const [name, value] of form.entries()) {
    if (typeof value !== 'string' || name.startsWith('$ACTION') || /password$/i.test(name))
      continue;
    const before = values[name];
    values[name] = before === undefined ? value : `${before}\n${value}`;
  }
  return values;
}

function place(node: Node, path: string[], value: FormDataEntryValue | FormDataEntryValue[]) {
  const [head = '', ...rest] = path;
  if (head === '__proto__' || head === 'constructor' || head === 'prototype') return;
  if (rest.length === 0) {
    node[head] = value;
    return;
  }
  const below = node[head];
  const next: Node = isNode(below) ? below : {};
  node[head] = next;
  place(next, rest, value);
}

function arraysWhereNumbered(value: Node[string]): unknown {
  if (!isNode(value)) return value;
  const keys = Object.keys(value);
  const inner = keys.map((key) => [key, arraysWhereNumbered(value[key] ?? '')] as const);
  if (keys.length > 0 && keys.every((key) => /^\d+$/.test(key))) {
    return inner.sort((a, b) => Number(a[0]) - Number(b[0])).map(([, item]) => item);
  }
  return Object.fromEntries(inner);
}

function isNode(value: unknown): value is Node {
  return typeof value === 'object' && value !== null && value.constructor === Object;
}
