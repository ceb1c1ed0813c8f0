import { useQuery } from '@tanstack/react-query';
import { Busy } from '#src/components/busy.tsx';
import { Button, LinkButton } from '#src/components/button.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Fault } from '#src/components/fault.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { countOf, useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useMay } from '#src/lib/session.ts';
import { useSearch } from '#src/lib/use-search.ts';
import { useWide } from '#src/lib/use-wide.ts';
import { dropsQuery } from '#src/features/rack/api/drops.ts';
import { DropCards } from '#src/features/rack/components/drop-card.tsx';
import { DropFilters } from '#src/features/rack/components/drop-filters.tsx';
import { DropTable } from '#src/features/rack/components/drop-table.tsx';
import { readFilter } from '#src/features/rack/hooks/read-filter.ts';

const NO_FILTER = { section: null, min: null, text: null, state: null };

/** Find a drop in half a minute: a table at the desk, tags on a phone. */
export function RackList() {
  const wide = useWide();
  const mayLog = useMay('drop:log');
  const { mass } = useFormats();
  const [get, set] = useSearch();
  const filter = readFilter(get);
  const drops = useQuery(dropsQuery(filter));
  const filtered =
    filter.section !== '' || filter.minLengthNm !== null || filter.text !== '' || filter.state !== 'here';
  const found = drops.data?.drops ?? [];

  return (
    <>
      <DropFilters filter={filter} onChange={set} />
      {drops.isError && !drops.data ? (
        <Fault {...faultWords(drops.error)} onRetry={() => void drops.refetch()} />
      ) : !drops.data ? (
        <Busy label="Looking through the rack" />
      ) : found.length > 0 ? (
        <div aria-busy={drops.isPlaceholderData || undefined}>
          <p role="status" className="mb-3 text-muted">
            {countOf(found.length, 'drop', 'drops')},{' '}
            <span className="font-mono">{mass(found.reduce((sum, drop) => sum + drop.massMg, 0))}</span>
          </p>
          {wide ? <DropTable drops={found} /> : <DropCards drops={found} />}
        </div>
      ) : filtered ? (
        <EmptyState
          title="No drop fits"
          actions={<Button onClick={() => set(NO_FILTER)}>Show what is on the rack</Button>}
        >
          Nothing on the rack has this section, length, tag, slot, heat and state. Take one of them away.
        </EmptyState>
      ) : (
        <EmptyState
          title="The rack is empty"
          actions={mayLog && <LinkButton to={paths.logDrop()}>Log the first drop</LinkButton>}
        >
          Log what lies in the yard, one drop after the other: section, length, slot and heat. Plans use it
          before they buy. Drops that cutting makes come here by themselves.
        </EmptyState>
      )}
    </>
  );
}
