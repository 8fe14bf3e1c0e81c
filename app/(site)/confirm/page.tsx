import type { Metadata } from 'next';
import { ConfirmForm } from '@/components/account/confirm-form';
import { FormPage } from '@/components/site/form-page';

export const metadata: Metadata = { title: 'Confirm your address', referrer: 'no-referrer' };

export default function ConfirmPage() {
  return (
    <FormPage title="Confirm your address">
      <ConfirmForm />
    </FormPage>
  );
}
