import { useSuspenseQueries } from '@tanstack/react-query';
import { useParams, type LoaderFunctionArgs } from 'react-router-dom';
import { Page } from '#src/components/page.tsx';
import { dropQuery } from '#src/features/rack/api/drops.ts';
import { DropChanges } from '#src/features/rack/components/drop-changes.tsx';
import { DropPage } from '#src/features/rack/components/drop-page.tsx';
import { STATE_WORDS } from '#src/features/rack/hooks/state-words.ts';
import { dropRulesQuery } from '#src/features/shop/api/drop-rules.ts';
import { formatTag } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { readId } from '#src/lib/read-id.ts';

export const loader = ({ params }: LoaderFunctionArgs) =>
  Promise.all([
    queryClient.ensureQueryData(dropQuery(readId(params.dropId))),
    queryClient.ensureQueryData(dropRulesQuery),
  ]);

export function Component() {
  const dropId = readId(useParams().dropId);
  const [view, rules] = useSuspenseQueries({ queries: [dropQuery(dropId), dropRulesQuery] });
  const { drop } = view.data;
  return (
    <Page
      title={`Drop ${formatTag(drop.tag)}`}
      sub={`${STATE_WORDS[drop.state]}${drop.state === 'racked' || drop.state === 'held' ? `, in slot ${drop.slot}` : ''}`}
      back={{ to: paths.rack(), label: 'Drop rack' }}
      actions={drop.can['drop:edit'] && <DropChanges drop={drop} />}
    >
      <DropPage
        view={view.data}
        keepFromNm={rules.data.rules.find((rule) => rule.family === drop.family)?.keepFromNm ?? null}
      />
    </Page>
  );
}
