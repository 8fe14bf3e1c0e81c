import type { SchemaNode } from './plan-schema';

/** The plan document's guide in Markdown: every record with its fields, worked out from the schema, then an example. */
export function planGuide(schema: SchemaNode, example: string): string {
  const records = Object.entries(schema.$defs ?? {});
  return [
    '# The plan document',
    '',
    'A plan is one JSON document: what is imported, exported, stored and taken to the bench. This page and',
    '`plan-document.schema.json` (JSON Schema, draft 2020-12) are written from the schema that the program reads with:',
    '`npx tsx scripts/write-plan-guide.ts`.',
    '',
    '- Lengths are whole numbers of 1/640 mm: 1 mm is 640, 1 in is 16 256, 1/128 in is 127.',
    '- Ids are chosen by the author and kept over revisions, since what a builder records refers to them.',
    '- A file has at most 12 MB and 16 levels. Fields that are not listed here are refused by name.',
    '- Beyond the schema the reader checks that each reference is there, that ids and labels are used once, that steps',
    '  and formulas do not go round in a circle, that sizes come to more than nothing, that pairs are even, that glue is',
    '  waited for only where there is a glue-up, and that no piece stands in two places.',
    '',
    '## Plan',
    '',
    ...fields(schema),
    ...records.flatMap(([name, node]) => record(name, node)),
    '## Example',
    '',
    'A whole plan, small, in which every kind of record occurs. It is imported as it stands.',
    '',
    '```json',
    example.trimEnd(),
    '```',
    '',
  ].join('\n');
}

function record(name: string, node: SchemaNode): string[] {
  const forms = node.oneOf?.every(({ properties }) => properties) ? node.oneOf : null;
  return [
    `## ${name}`,
    '',
    ...(node.description ? [node.description, ''] : []),
    ...(forms
      ? forms.flatMap((form) => [`With \`kind\` ${constOf(form.properties?.kind)}:`, '', ...fields(form)])
      : node.properties
        ? fields(node)
        : [`Is ${kindOf(node)}.`, '']),
  ];
}

function fields(node: SchemaNode): string[] {
  const rows = rowsOf(node, '');
  return ['| field | is | meaning |', '| --- | --- | --- |', ...rows, ''];
}

/** One row for each field; fields of unnamed objects follow theirs with a dotted name. */
function rowsOf(node: SchemaNode, prefix: string): string[] {
  return Object.entries(node.properties ?? {}).flatMap(([name, field]) => {
    const must = node.required?.includes(name);
    const without = field.default === undefined ? 'may be left out' : `else ${JSON.stringify(field.default)}`;
    const is = `${kindOf(field)}${must ? '' : `; ${without}`}`;
    const row = `| \`${prefix}${name}\` | ${cell(is)} | ${cell(field.description ?? '')} |`;
    const inner = field.properties ? field : listed(field);
    const dotted = field.properties ? `${prefix}${name}.` : `${prefix}${name}[].`;
    return [row, ...(inner?.properties ? rowsOf(inner, dotted) : formRows(field, `${prefix}${name}`))];
  });
}

function formRows(field: SchemaNode, name: string): string[] {
  const list = listed(field);
  const forms = [...(field.oneOf ?? field.anyOf ?? []), ...(list?.anyOf ?? list?.oneOf ?? [])];
  return forms.flatMap((form) => (form.properties ? rowsOf(form, `${name}${list ? '[]' : ''}.`) : []));
}

const listed = (field: SchemaNode): SchemaNode | null => (typeof field.items === 'object' ? field.items : null);

function kindOf(node: SchemaNode): string {
  if (node.$ref) return link(node.$ref);
  if (node.const !== undefined) return constOf(node);
  if (node.enum) return node.enum.map((value) => `\`${String(value)}\``).join(', ');
  const forms = node.anyOf ?? node.oneOf;
  if (forms) return [...new Set(forms.map(kindOf))].join(' or ');
  if (node.prefixItems) return `list of ${node.prefixItems.map(kindOf).join(', ')}`;
  if (node.type === 'array')
    return `list (${between(node.minItems, node.maxItems).slice(2)}) of ${kindOf(listed(node) ?? {})}`;
  if (node.type === 'string') return stringKind(node);
  if (node.type === 'boolean') return '`true` or `false`';
  if (node.type === 'object') return 'record';
  return `${node.type === 'integer' ? 'whole number' : 'number'}${numberRange(node)}`;
}

function stringKind(node: SchemaNode): string {
  if (node.format === 'base64') return 'base64';
  if (node.pattern) return `text like \`${node.pattern}\``;
  return `text${between(node.minLength, node.maxLength, ' characters')}`;
}

function numberRange({ minimum, exclusiveMinimum, maximum }: SchemaNode): string {
  const whole = (bound: number | undefined) =>
    bound !== undefined && Math.abs(bound) < Number.MAX_SAFE_INTEGER ? bound : undefined;
  if (exclusiveMinimum !== undefined) return `, above ${exclusiveMinimum}${maximum ? `, to ${maximum}` : ''}`;
  return between(whole(minimum), whole(maximum));
}

function between(least: number | undefined, most: number | undefined, unit = ''): string {
  if (least === undefined && most === undefined) return '';
  if (most === undefined) return `, at least ${least}${unit}`;
  return `, ${least ?? 0} to ${most}${unit}`;
}

const link = (ref: string) => {
  const name = ref.replace('#/$defs/', '');
  return `[${name}](#${name.toLowerCase()})`;
};
const constOf = (node: SchemaNode | undefined) => `\`${String(node?.const)}\``;
const cell = (text: string) => text.replaceAll('|', '\\|').replaceAll('\n', ' ');
