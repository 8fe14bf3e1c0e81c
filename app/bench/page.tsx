import type { Metadata } from 'next';
import { Suspense } from 'react';
import { Bench } from '@/components/bench/bench';
import { BlankBench } from '@/components/bench/shell/blank-bench';
import './bench.css';

export const metadata: Metadata = { title: 'Bench' };

/** One prerendered page for every bench address; what it shows is chosen on the phone from the search parameters. */
export default function BenchPage() {
  return (
    <Suspense fallback={<BlankBench />}>
      <Bench />
    </Suspense>
  );
}
