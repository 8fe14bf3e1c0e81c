import { exportPlan } from '@/lib/server/commands/export-plan';
import { planParams } from '@/lib/server/request/build-params';
import { route } from '@/lib/server/route';

/** The plan's present revision as a file that imports to the same content. */
export const GET = route({ auth: 'member', params: planParams }, async ({ account, params }) => {
  const { fileName, text } = await exportPlan(account, params.planId);
  return new Response(text, {
    headers: { 'content-type': 'application/json', 'content-disposition': `attachment; filename="${fileName}"` },
  });
});
