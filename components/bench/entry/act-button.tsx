import type { ComponentProps } from 'react';
import { Button } from '@/components/ui/button';

interface ActButtonProps extends Omit<ComponentProps<typeof Button>, 'kind'> {
  kind?: 'act' | 'danger';
}

/** An act beside the plate: as high as a gloved thumb needs (81 px, 13 mm), its word large enough for arm's length. */
export function ActButton({ kind = 'act', className = '', ...rest }: ActButtonProps) {
  return (
    <Button {...rest} kind={kind} className={`min-h-[81px]! px-3! text-[1.3125rem]! leading-tight ${className}`} />
  );
}
