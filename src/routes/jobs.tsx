import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Page } from '#src/components/page.tsx';
import { useToast } from '#src/components/toast.tsx';
import { jobsQuery } from '#src/features/jobs/api/jobs.ts';
import { JobForm } from '#src/features/jobs/components/job-form.tsx';
import { Jobs } from '#src/features/jobs/components/jobs.tsx';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';

export const loader = () => queryClient.ensureQueryData(jobsQuery);

export function Component() {
  const { jobs, can } = useSuspenseQuery(jobsQuery).data;
  const navigate = useNavigate();
  const say = useToast();
  const [making, setMaking] = useState(false);
  const mayEdit = can['job:edit'] ?? false;
  return (
    <Page
      title="Jobs"
      sub="Orders in the shop, their part lists, and how much of them is planned and cut."
      actions={
        mayEdit && (
          <Button variant="act" onClick={() => setMaking(true)}>
            Make a job
          </Button>
        )
      }
    >
      <Jobs jobs={jobs} mayEdit={mayEdit} onMake={() => setMaking(true)} />
      <Dialog open={making} onOpenChange={setMaking} title="Make a job">
        <JobForm
          job={null}
          onSaved={(job) => {
            say(`Job ${job.number} is made. Bring in its part list.`);
            void navigate(paths.job(job.id));
          }}
        />
      </Dialog>
    </Page>
  );
}
