import { writeFileSync } from 'node:fs';
import { guideFiles } from './plan-guide/guide-files';

/** Writes docs/plan-document.*: npx tsx scripts/write-plan-guide.ts */
for (const [name, text] of Object.entries(guideFiles())) {
  writeFileSync(`docs/${name}`, text);
  console.log(`docs/${name}`);
}
