import { Button } from 'antd';
import type { JobDto } from '@mantlet/common';
import { ApiError } from '../../../lib/api-client.js';
import { formatNumber } from '../../../lib/format.js';
import { useJobs, useRetryJob } from '../api/jobs.js';
import { percentOf, sayJob } from '../job-words.js';
import '../live.css';

/** What goes on in the background, above every page: its numbers are not there yet, and people may leave it alone. */
export function JobProgress({ projectId, enabled }: { projectId: string; enabled: boolean }) {
  const jobs = useJobs(projectId, enabled);
  return <div role="status" aria-live="off">{jobs.data?.map((job) => <Line key={job.id} job={job} projectId={projectId} />)}</div>;
}

function Line({ job, projectId }: { job: JobDto; projectId: string }) {
  const retry = useRetryJob(projectId);
  const percent = percentOf(job);
  const attention = job.state === 'failed' || job.withoutWorker;
  return (
    <div className={`mt-job${attention ? ' mt-attention' : ''}`}>
      <p>{sayJob(job)}</p>
      {job.state === 'failed' ? (
        <>
          <Button size="small" loading={retry.isPending} onClick={() => retry.mutate(job.id)}>Try again</Button>
          {retry.error && <p role="alert">{retry.error instanceof ApiError ? retry.error.message : 'That did not go through. Try again.'}</p>}
        </>
      ) : (
        <div className="mt-job-bar" role="progressbar" aria-label={`Recalculating ${formatNumber(job.total)} members`} aria-valuemin={0} aria-valuemax={100} aria-valuenow={percent}>
          <span style={{ width: `${percent}%` }} />
        </div>
      )}
    </div>
  );
}
