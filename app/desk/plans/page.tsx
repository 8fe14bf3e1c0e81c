import type { Metadata } from 'next';
import { ImportPlan } from '@/components/desk/import-plan';
import { PlanList } from '@/components/desk/plan-list';
import { requireSession } from '@/lib/server/auth/current-account';
import { listPlans } from '@/lib/server/queries/plans';

export const metadata: Metadata = { title: 'Plans' };

export default async function PlansPage() {
  const { account } = await requireSession('/desk/plans');
  const plans = await listPlans(account.id);
  return (
    <div className="grid gap-8">
      <h1 className="text-4xl">Plans</h1>
      <PlanList initial={plans} />
      <ImportPlan />
    </div>
  );
}
