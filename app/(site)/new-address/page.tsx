import type { Metadata } from 'next';
import { NewAddressForm } from '@/components/account/new-address-form';
import { FormPage } from '@/components/site/form-page';

export const metadata: Metadata = { title: 'Confirm your new address', referrer: 'no-referrer' };

export default function NewAddressPage() {
  return (
    <FormPage title="Confirm your new address">
      <NewAddressForm />
    </FormPage>
  );
}
