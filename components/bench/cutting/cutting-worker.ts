import { CuttingRequestError, type CuttingJob } from '@/lib/domain/cutting';
import { planJob, type PlannedJob } from './planned-job';

/** What the worker answers for each job, in the order of the jobs. */
export type CuttingAnswer = { index: number } & ({ planned: PlannedJob } | { fault: string });

declare const self: {
  onmessage: ((event: MessageEvent<CuttingJob[]>) => void) | null;
  postMessage: (answer: CuttingAnswer) => void;
};

// Off the screen's own thread, so that nothing under a finger waits for it.
self.onmessage = ({ data: jobs }) => {
  jobs.forEach((job, index) => {
    try {
      self.postMessage({ index, planned: planJob(job) });
    } catch (error) {
      if (!(error instanceof CuttingRequestError)) throw error;
      self.postMessage({ index, fault: error.message });
    }
  });
};
