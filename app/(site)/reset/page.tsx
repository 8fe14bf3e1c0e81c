import type { Metadata } from 'next';
import { ResetForm } from '@/components/account/reset-form';
import { FormPage } from '@/components/site/form-page';

export const metadata: Metadata = { title: 'Set a new password', referrer: 'no-referrer' };

export default function ResetPage() {
  return (
    <FormPage title="Set a new password">
      <ResetForm />
    </FormPage>
  );
}
