import { useSuspenseQuery } from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { LinkButton } from '#src/components/button.tsx';
import { Figure, FigureRow } from '#src/components/figure-row.tsx';
import { Page } from '#src/components/page.tsx';
import { useToast } from '#src/components/toast.tsx';
import { partListQuery } from '#src/features/part-lists/api/part-lists.ts';
import { DeletePartList } from '#src/features/part-lists/components/delete-part-list.tsx';
import { PartLines } from '#src/features/part-lists/components/part-lines.tsx';
import { PartListFacts } from '#src/features/part-lists/components/part-list-facts.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { progressWords } from '#src/lib/progress-words.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';
import { wholeNumber } from '#src/lib/whole-number.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  queryClient.ensureQueryData(partListQuery(readId(params.partListId)));

export function Component() {
  const partListId = readId(useParams().partListId);
  const { partList, lines } = useSuspenseQuery(partListQuery(partListId)).data;
  const { mass } = useFormats();
  const navigate = useNavigate();
  const say = useToast();
  const planned = lines.reduce((sum, line) => sum + line.planned, 0);
  const cut = lines.reduce((sum, line) => sum + line.cut, 0);
  const open = lines.some((line) => line.planned < line.quantity);
  return (
    <Page
      title={partList.name}
      back={{ to: paths.job(partList.jobId), label: `Job ${partList.jobNumber}` }}
      sub={partList.revision ? `Part list, revision ${partList.revision}` : 'Part list'}
      actions={
        <>
          {partList.can['part-list:remove'] && (
            <DeletePartList
              partList={partList}
              onDeleted={async () => {
                say(`${partList.name} is deleted.`);
                await navigate(paths.job(partList.jobId));
              }}
            />
          )}
          {partList.can['plan:draft'] && open && (
            <LinkButton to={paths.newPlan({ partList: partList.id })} variant="act">
              Plan these
            </LinkButton>
          )}
        </>
      }
    >
      <FigureRow>
        <Figure value={wholeNumber(partList.lines)} label={partList.lines === 1 ? 'line' : 'lines'} />
        <Figure value={wholeNumber(partList.pieces)} label={partList.pieces === 1 ? 'piece' : 'pieces'} />
        <Figure value={mass(partList.massMg)} label="of steel, nominal" />
        <Figure value={wholeNumber(planned)} label="in plans" />
        <Figure
          value={wholeNumber(cut)}
          label="cut"
          note={progressWords({ pieces: partList.pieces, planned, cut })}
        />
      </FigureRow>
      <div className="mt-6">
        <PartListFacts partList={partList} />
      </div>
      <h2 className="mt-8 mb-3">Lines</h2>
      <PartLines lines={lines} />
    </Page>
  );
}
