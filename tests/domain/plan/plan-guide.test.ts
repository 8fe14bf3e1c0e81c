import { readFileSync } from 'node:fs';
import Ajv2020 from 'ajv/dist/2020';
import { describe, expect, it } from 'vitest';
import { readPlan } from '@/lib/domain/plan/read-plan';
import { bootTray } from '@/plans/boot-tray/index';
import { guideFiles } from '@/scripts/plan-guide/guide-files';
import { planSchema } from '@/scripts/plan-guide/plan-schema';

const validate = new Ajv2020({ strict: false, formats: { base64: true } }).compile(planSchema());
const read = (file: string): unknown => JSON.parse(readFileSync(file, 'utf8'));

describe('the guide to the plan document', () => {
  it.each(Object.entries(guideFiles()))('%s is what is committed', (name, text) => {
    expect(readFileSync(`docs/${name}`, 'utf8'), 'run npx tsx scripts/write-plan-guide.ts').toBe(text);
  });

  it('names every field of every record', () => {
    const guide = guideFiles()['plan-document.md']!;
    const records = [planSchema(), ...Object.values(planSchema().$defs!)];
    const fields = records
      .flatMap((node) => [node, ...(node.oneOf ?? [])])
      .flatMap((n) => Object.keys(n.properties ?? {}));
    expect(fields.length).toBeGreaterThan(100);
    expect(fields.filter((field) => !guide.includes(`\`${field}\``))).toEqual([]);
  });

  it('has an example that the reader takes, in which every record and every field of it occurs', () => {
    expect(readPlan(JSON.parse(JSON.stringify(bootTray)))).toMatchObject({ ok: true });
    for (const [list, rows] of Object.entries(bootTray).filter(([, value]) => Array.isArray(value))) {
      if (list !== 'attachments') expect((rows as unknown[]).length, list).toBeGreaterThan(0);
    }
  });
});

describe('the JSON Schema', () => {
  it.each(['plans/hall-bench.json', 'plans/folding-trestles.json', 'docs/plan-document.example.json'])(
    'takes %s',
    (file) => {
      expect(validate(read(file)), JSON.stringify(validate.errors)).toBe(true);
    },
  );

  it('refuses what the reader refuses for its shape', () => {
    const broken: ((plan: Record<string, unknown>) => void)[] = [
      (plan) => delete plan.title,
      (plan) => (plan.units = 'cubits'),
      (plan) => (plan.extra = 1),
      (plan) => (plan.parts = []),
      (plan) => ((plan.parts as { length: unknown }[])[0]!.length = 12.5),
      (plan) => ((plan.steps as { id: unknown }[])[0]!.id = 'Cut It'),
    ];
    for (const breakIt of broken) {
      const plan = JSON.parse(JSON.stringify(bootTray)) as Record<string, unknown>;
      breakIt(plan);
      expect([validate(plan), readPlan(plan).ok], breakIt.toString()).toEqual([false, false]);
    }
  });
});
