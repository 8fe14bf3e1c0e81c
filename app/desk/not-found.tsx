import Link from 'next/link';
import { linkLook } from '@/components/ui/link-look';

export default function NotHere() {
  return (
    <div className="grid justify-items-start gap-4">
      <h1 className="text-4xl">Not here</h1>
      <p className="text-xl">There is no such build, or you are not of its crew.</p>
      <Link href="/desk" className={linkLook.act}>
        Your builds
      </Link>
    </div>
  );
}
