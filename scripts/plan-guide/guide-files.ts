import { bootTray } from '@/plans/boot-tray/index';
import { planGuide } from './plan-guide';
import { planSchema } from './plan-schema';

/** The files of the plan document's guide, by name in docs/, as they must be committed. */
export function guideFiles(): Record<string, string> {
  const schema = planSchema();
  const example = `${JSON.stringify(bootTray, null, 2)}\n`;
  return {
    'plan-document.schema.json': `${JSON.stringify(schema, null, 2)}\n`,
    'plan-document.example.json': example,
    'plan-document.md': planGuide(schema, example),
  };
}
