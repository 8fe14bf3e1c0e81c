import { useEffect, useState } from 'react';
import { packFile } from '@/lib/device/pack';
import { useBench } from '../shell/bench-context';
import { useBuild } from '../shell/build-context';

/** A file of the pack on this phone: its address for the page, while it is looked for, or that it is not here. */
export type PackFileOnPhone = { state: 'looking' } | { state: 'here'; address: string } | { state: 'absent' };

export function usePackFile(sha256: string): PackFileOnPhone {
  const { account } = useBench();
  const { build } = useBuild();
  const [found, setFound] = useState<PackFileOnPhone>({ state: 'looking' });
  useEffect(() => {
    let wanted = true;
    let address: string | null = null;
    const look = async () => {
      // Browsers without a secure context have no caches at all.
      const blob =
        typeof caches === 'undefined'
          ? null
          : await packFile(caches, { accountId: account.accountId, buildId: build.id, sha256 });
      if (!wanted) return;
      if (blob) address = URL.createObjectURL(blob);
      setFound(address ? { state: 'here', address } : { state: 'absent' });
    };
    look().catch((error: unknown) => {
      console.error(error);
      if (wanted) setFound({ state: 'absent' });
    });
    return () => {
      wanted = false;
      if (address) URL.revokeObjectURL(address);
    };
  }, [account.accountId, build.id, sha256]);
  return found;
}
