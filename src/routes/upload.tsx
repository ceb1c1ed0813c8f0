import { useSuspenseQuery } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { Notice } from '#src/components/notice.tsx';
import { Page } from '#src/components/page.tsx';
import { jobQuery } from '#src/features/jobs/api/jobs.ts';
import { Upload } from '#src/features/part-lists/components/upload.tsx';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';
import { useSession } from '#src/lib/session.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  queryClient.ensureQueryData(jobQuery(readId(params.jobId)));

export function Component() {
  const jobId = readId(useParams().jobId);
  const { job } = useSuspenseQuery(jobQuery(jobId)).data;
  const { person } = useSession();
  return (
    <Page
      title="Bring in a part list"
      back={{ to: paths.job(jobId), label: `Job ${job.number} · ${job.name}` }}
      sub="The file is read here, every row that is not clear is shown, and nothing is guessed."
    >
      {person && job.can['part-list:edit'] ? (
        <Upload key={jobId} personId={person.id} jobId={jobId} />
      ) : (
        <Notice>
          Detailers and managers bring in part lists. Ask one of them, or a manager for the role.
        </Notice>
      )}
    </Page>
  );
}
