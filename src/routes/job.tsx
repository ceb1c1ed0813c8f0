import { useSuspenseQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { Button, LinkButton } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Page } from '#src/components/page.tsx';
import { useToast } from '#src/components/toast.tsx';
import { jobQuery } from '#src/features/jobs/api/jobs.ts';
import { JobFigures } from '#src/features/jobs/components/job-figures.tsx';
import { JobForm } from '#src/features/jobs/components/job-form.tsx';
import { PartListsOfJob } from '#src/features/part-lists/components/part-lists-of-job.tsx';
import { TemplateLinks } from '#src/features/part-lists/components/template-links.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  queryClient.ensureQueryData(jobQuery(readId(params.jobId)));

export function Component() {
  const jobId = readId(useParams().jobId);
  const { job, partLists } = useSuspenseQuery(jobQuery(jobId)).data;
  const { date } = useFormats();
  const say = useToast();
  const [changing, setChanging] = useState(false);
  const mayUpload = job.can['part-list:edit'] ?? false;
  const mayPlan = job.can['plan:draft'] ?? false;
  const open = job.pieces > job.piecesPlanned;
  return (
    <Page
      title={`Job ${job.number} · ${job.name}`}
      back={{ to: paths.jobs(), label: 'Jobs' }}
      sub={`${job.customer ? `${job.customer} · ` : ''}since ${date(job.createdAt)}`}
      actions={
        <>
          {job.can['job:edit'] && <Button onClick={() => setChanging(true)}>Change</Button>}
          {mayPlan && open && (
            <LinkButton to={paths.newPlan({ job: job.id })} variant={mayUpload ? 'plain' : 'act'}>
              Plan this job
            </LinkButton>
          )}
          {mayUpload && (
            <LinkButton to={paths.upload(job.id)} variant="act">
              Bring in a part list
            </LinkButton>
          )}
        </>
      }
    >
      <JobFigures job={job} />
      <h2 className="mt-8 mb-2 first:mt-0">Part lists</h2>
      {partLists.length === 0 ? (
        <EmptyState title="No part list yet" actions={<TemplateLinks />}>
          {mayUpload
            ? 'Bring in the part list of the drawing: a CSV file, or rows pasted from a spreadsheet. Headings and notations of most shops are understood; what is not clear is asked.'
            : 'Detailers and managers bring in part lists.'}
        </EmptyState>
      ) : (
        <PartListsOfJob jobId={job.id} partLists={partLists} />
      )}
      <Dialog open={changing} onOpenChange={setChanging} title={`Change job ${job.number}`}>
        <JobForm
          job={job}
          onSaved={(saved) => {
            setChanging(false);
            say(`Job ${saved.number} is saved.`);
          }}
        />
      </Dialog>
    </Page>
  );
}
