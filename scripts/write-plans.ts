import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import sharp from 'sharp';
import type { PlanDocumentInput } from '@/lib/domain/plan/document';
import { readPlan } from '@/lib/domain/plan/read-plan';
import { drawElevations } from '@/plans/draw-elevations';
import { foldingTrestles } from '@/plans/folding-trestles/index';
import { hallBench } from '@/plans/hall-bench/index';

/**
 * Writes plans/*.json from their sources: npx tsx scripts/write-plans.ts
 * With --draw the drawings are made anew; otherwise the committed ones are put in, so that every machine writes the same.
 */
const plans = { 'hall-bench': hallBench, 'folding-trestles': foldingTrestles };

for (const [name, plan] of Object.entries(plans)) {
  const file = `plans/${name}/elevations.png`;
  if (process.argv.includes('--draw') || !existsSync(file)) {
    await sharp(Buffer.from(drawElevations(plan)))
      .png({ compressionLevel: 9, palette: true })
      .toFile(file);
  }
  const document = withDrawing(plan, readFileSync(file));
  const read = readPlan(JSON.parse(JSON.stringify(document)));
  if (!read.ok) throw new Error(`${name}: ${JSON.stringify(read.problems, null, 2)}`);
  writeFileSync(`plans/${name}.json`, `${JSON.stringify(document, null, 2)}\n`);
  console.log(`plans/${name}.json: ${plan.steps.length} steps, ${plan.parts.length} parts`);
}

function withDrawing(plan: PlanDocumentInput, bytes: Buffer): PlanDocumentInput {
  const drawing = {
    id: 'elevations',
    title: 'Front and side, with the main sizes',
    kind: 'drawing' as const,
    mediaType: 'image/png' as const,
    sha256: createHash('sha256').update(bytes).digest('hex'),
    bytes: bytes.byteLength,
    steps: [],
    content: bytes.toString('base64'),
  };
  return { ...plan, attachments: [drawing] };
}
