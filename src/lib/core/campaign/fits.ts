import type * as v from 'valibot';

type Test = (value: unknown) => boolean;
/** A schema or a step of its pipe, as valibot describes itself. */
interface Node {
  type: string;
  pipe?: readonly Node[];
  requirement?: unknown;
  literal?: unknown;
  options?: readonly unknown[];
  wrapped?: Node;
  item?: Node;
  key?: string;
  entries?: Readonly<Record<string, Node>>;
}

/** What cannot be told here is left to the schema itself. */
const unsure: Test = () => false;

/**
 * A quick test that says true only of what a schema accepts and hands back as it is: it makes no copy and no list of what
 * is wrong. False means: ask the schema.
 * Cost: one look at each field. Checked by: test/core/campaign/fits.test.ts.
 */
export const fits = (schema: v.GenericSchema): Test => testOf(schema as unknown as Node);

function testOf(node: Node): Test {
  if (node.pipe) {
    // A pipe begins with the schema it was made of.
    const [first = unsure, ...rest] = node.pipe.map((step) => (step === node ? unsure : testOf(step)));
    if (rest.length === 1) {
      const [then = unsure] = rest;
      return (value) => first(value) && then(value);
    }
    return (value) => first(value) && rest.every((step) => step(value));
  }
  return byType[node.type]?.(node) ?? unsure;
}

const byType: Readonly<Record<string, (node: Node) => Test>> = {
  string: () => (value) => typeof value === 'string',
  number: () => (value) => typeof value === 'number' && !Number.isNaN(value),
  boolean: () => (value) => typeof value === 'boolean',
  unknown: () => () => true,
  literal:
    ({ literal }) =>
    (value) =>
      value === literal,
  picklist:
    ({ options = [] }) =>
    (value) =>
      options.includes(value),
  nullable: ({ wrapped }) => {
    const inner = wrapped ? testOf(wrapped) : unsure;
    return (value) => value === null || inner(value);
  },
  array: ({ item }) => array(item ? testOf(item) : unsure),
  strict_object: ({ entries = {} }) => strictObject(entries),
  variant: ({ key = '', options = [] }) => variant(key, options as readonly Node[]),
  // Steps of a pipe: the schema before them has looked at the type.
  regex:
    ({ requirement }) =>
    (value) =>
      (requirement as RegExp).test(value as string),
  min_length:
    ({ requirement }) =>
    (value) =>
      (value as string | unknown[]).length >= (requirement as number),
  max_length:
    ({ requirement }) =>
    (value) =>
      (value as string | unknown[]).length <= (requirement as number),
  integer: () => (value) => Number.isInteger(value),
  finite: () => (value) => Number.isFinite(value),
  min_value:
    ({ requirement }) =>
    (value) =>
      (value as number) >= (requirement as number),
  max_value:
    ({ requirement }) =>
    (value) =>
      (value as number) <= (requirement as number),
  gt_value:
    ({ requirement }) =>
    (value) =>
      (value as number) > (requirement as number),
  lt_value:
    ({ requirement }) =>
    (value) =>
      (value as number) < (requirement as number)
};

function array(inner: Test): Test {
  return (value) => {
    if (!Array.isArray(value)) return false;
    // Not `every`, which leaves out what was deleted from a list.
    for (let at = 0; at < value.length; at++) if (!inner(value[at])) return false;
    return true;
  };
}

function strictObject(entries: Readonly<Record<string, Node>>): Test {
  const fields = Object.entries(entries).map(([key, node]) => {
    const optional = node.type === 'exact_optional';
    const inner = optional ? node.wrapped : node;
    return { key, optional, test: inner ? testOf(inner) : unsure };
  });
  return (value) => {
    if (value === null || typeof value !== 'object') return false;
    let present = 0;
    for (const { key, optional, test } of fields) {
      const field = (value as Record<string, unknown>)[key];
      if (field === undefined && !(key in value)) {
        if (optional) continue;
        return false;
      }
      if (!test(field)) return false;
      present++;
    }
    for (const _key in value) present--;
    return present === 0;
  };
}

function variant(key: string, options: readonly Node[]): Test {
  const tests = new Map<unknown, Test>();
  for (const option of options) {
    const name = option.entries?.[key];
    if (name?.type === 'literal') tests.set(name.literal, testOf(option));
  }
  return (value) =>
    value !== null &&
    typeof value === 'object' &&
    (tests.get((value as Record<string, unknown>)[key]) ?? unsure)(value);
}
