import { useEffect, useState } from 'react';
import type { CuttingJob } from '@/lib/domain/cutting';
import type { CuttingAnswer } from './cutting-worker';
import type { PlannedJob } from './planned-job';

export type JobAnswer =
  { state: 'planning' } | { state: 'planned'; planned: PlannedJob } | { state: 'fault'; words: string };

/** Plans the jobs in a worker; a change of the jobs begins anew. `jobs` must keep its identity while it is the same. */
export function useCuttingPlans(jobs: readonly CuttingJob[]): JobAnswer[] {
  const [answered, setAnswered] = useState<{ jobs: readonly CuttingJob[]; answers: ReadonlyMap<number, JobAnswer> }>({
    jobs,
    answers: new Map(),
  });
  useEffect(() => {
    const put = (index: number, answer: JobAnswer) =>
      setAnswered((before) => ({
        jobs,
        answers: new Map([...(before.jobs === jobs ? before.answers : []), [index, answer]]),
      }));
    const failed = () =>
      jobs.forEach((_, index) =>
        put(index, { state: 'fault', words: 'It could not be worked out. Open this screen again.' }),
      );
    const worker = new Worker(new URL('./cutting-worker.ts', import.meta.url), { type: 'module' });
    worker.onmessage = ({ data }: MessageEvent<CuttingAnswer>) =>
      put(
        data.index,
        'planned' in data ? { state: 'planned', planned: data.planned } : { state: 'fault', words: data.fault },
      );
    worker.onerror = (event) => {
      console.error(event.message);
      failed();
    };
    worker.postMessage(jobs);
    return () => worker.terminate();
  }, [jobs]);
  return jobs.map((_, index) => (answered.jobs === jobs && answered.answers.get(index)) || { state: 'planning' });
}
