import { useSuspenseQueries } from '@tanstack/react-query';
import { useState } from 'react';
import type { Drop } from '#shared/schemas/rack.ts';
import { Notice } from '#src/components/notice.tsx';
import { Page } from '#src/components/page.tsx';
import { onRackQuery } from '#src/features/rack/api/drops.ts';
import { DropCards } from '#src/features/rack/components/drop-card.tsx';
import { FreshTag } from '#src/features/rack/components/fresh-tag.tsx';
import { LogDrop } from '#src/features/rack/components/log-drop.tsx';
import { latelyRacked, recentSections } from '#src/features/rack/hooks/recent-sections.ts';
import { dropRulesQuery } from '#src/features/shop/api/drop-rules.ts';
import { queryClient } from '#src/lib/query-client.ts';
import { useMay } from '#src/lib/session.ts';
import { paths } from '#src/lib/paths.ts';

export const loader = () =>
  Promise.all([queryClient.ensureQueryData(onRackQuery), queryClient.ensureQueryData(dropRulesQuery)]);

const SHOWN_LATELY = 4;

export function Component() {
  const [racked, rules] = useSuspenseQueries({ queries: [onRackQuery, dropRulesQuery] });
  const mayLog = useMay('drop:log');
  const [logged, setLogged] = useState<Drop | null>(null);
  const [round, setRound] = useState(0);
  const [lastSlot, setLastSlot] = useState('');
  const lately = latelyRacked(racked.data.drops, SHOWN_LATELY);
  return (
    <Page title="Log a drop" back={{ to: paths.rack(), label: 'Drop rack' }}>
      <div className="grid max-w-5xl gap-x-12 gap-y-10 lg:grid-cols-[minmax(0,30rem)_1fr]">
        {!mayLog ? (
          <Notice>Operators, yard hands and managers log drops. Tell one of them what you found.</Notice>
        ) : logged ? (
          <FreshTag
            drop={logged}
            onAgain={() => {
              setLastSlot(logged.slot);
              setLogged(null);
              setRound(round + 1);
            }}
          />
        ) : (
          <LogDrop
            key={round}
            recent={recentSections(racked.data.drops)}
            rules={rules.data.rules}
            lastSlot={lastSlot}
            onLogged={setLogged}
          />
        )}
        {lately.length > 0 && (
          <section className="min-w-0">
            <h2 className="mb-3">Lately racked</h2>
            <div className="lg:[&_ul]:grid-cols-1">
              <DropCards drops={lately} />
            </div>
          </section>
        )}
      </div>
    </Page>
  );
}
