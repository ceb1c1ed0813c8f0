import { useState } from 'react';
import type { Station } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { ConfirmDialog, Dialog } from '#src/components/dialog.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { useToast } from '#src/components/toast.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { FAMILY_WORDS } from '#src/lib/family-words.ts';
import { useFormats } from '#src/lib/formats.ts';
import { useDeleteStation } from '#src/features/shop/api/stations.ts';
import { StationForm } from '#src/features/shop/components/station-form.tsx';

const METHOD_WORDS = { shear: 'shear', saw: 'saw', thermal: 'torch or plasma' } as const;

type StationListProps = {
  stations: readonly Station[];
  mayEdit: boolean;
  /** A new station is being written. */
  adding: boolean;
  onAddingChange: (adding: boolean) => void;
};

export function StationList({ stations, mayEdit, adding, onAddingChange }: StationListProps) {
  const say = useToast();
  const { length } = useFormats();
  const [changing, setChanging] = useState<Station | null>(null);
  const [deleting, setDeleting] = useState<Station | null>(null);
  const remove = useDeleteStation();
  const allowance = (nm: number) => (nm === 0 ? 'none' : length(nm));

  const columns: Column<Station>[] = [
    {
      key: 'name',
      head: 'Station',
      rowHead: true,
      cell: (station) => <span className="font-semibold">{station.name}</span>,
    },
    { key: 'method', head: 'Cuts by', cell: (station) => METHOD_WORDS[station.method] },
    { key: 'kerf', head: 'Kerf', align: 'right', mono: true, cell: (station) => allowance(station.kerfNm) },
    {
      key: 'head',
      head: 'Head crop',
      align: 'right',
      mono: true,
      cell: (station) => allowance(station.headCropNm),
    },
    {
      key: 'tail',
      head: 'Tail crop',
      align: 'right',
      mono: true,
      cell: (station) => allowance(station.tailCropNm),
    },
    {
      key: 'hold',
      head: 'Hold-down',
      align: 'right',
      mono: true,
      cell: (station) => allowance(station.holdDownNm),
    },
    {
      key: 'stop',
      head: 'Longest stop',
      align: 'right',
      mono: true,
      cell: (station) => (station.longestStopNm === null ? 'any' : length(station.longestStopNm)),
    },
    {
      key: 'families',
      fullLine: true,
      head: 'Sections',
      className: 'sm:min-w-44',
      cell: (station) => (
        <>
          {station.families.map((family) => FAMILY_WORDS[family]).join(', ')}
          {station.note && <span className="block text-[0.9375rem] text-muted">{station.note}</span>}
        </>
      ),
    },
    ...(mayEdit
      ? [
          {
            key: 'actions',
            fullLine: true,
            head: <span className="sr-only">Change or delete</span>,
            align: 'right' as const,
            cell: (station: Station) => (
              <span className="flex gap-2 sm:justify-end">
                <Button
                  size="small"
                  onClick={() => setChanging(station)}
                  aria-label={`Change ${station.name}`}
                >
                  Change
                </Button>
                <Button
                  size="small"
                  variant="quiet"
                  onClick={() => setDeleting(station)}
                  aria-label={`Delete ${station.name}`}
                >
                  Delete
                </Button>
              </span>
            ),
          },
        ]
      : []),
  ];

  return (
    <>
      {stations.length === 0 ? (
        <EmptyState title="No station yet">
          A station is a shear, a saw or a torch. Its kerf and crops are what a plan takes off every bar.
          {!mayEdit && ' A manager of the shop can add one.'}
        </EmptyState>
      ) : (
        <Table
          caption="Stations and their allowances"
          columns={columns}
          rows={stations}
          rowKey={(station) => station.id}
        />
      )}
      <Dialog
        open={adding || changing !== null}
        onOpenChange={(open) => {
          if (open) return;
          onAddingChange(false);
          setChanging(null);
        }}
        title={changing ? changing.name : 'Add a station'}
      >
        <StationForm
          key={changing?.id ?? 'new'}
          station={changing}
          onSaved={(saved) => {
            onAddingChange(false);
            setChanging(null);
            say(`${saved.name} is saved.`);
          }}
        />
      </Dialog>
      <ConfirmDialog
        open={deleting !== null}
        onOpenChange={(open) => {
          if (!open) setDeleting(null);
          remove.reset();
        }}
        title={`Delete ${deleting?.name ?? ''}`}
        confirmLabel="Delete station"
        tone="danger"
        busy={remove.isPending}
        error={remove.isError ? faultWords(remove.error).message : null}
        onConfirm={() => {
          if (!deleting) return;
          remove.mutate(deleting.id, {
            onSuccess: () => {
              say(`${deleting.name} is deleted.`);
              setDeleting(null);
            },
          });
        }}
      >
        <p>New plans cannot be issued to it any more. Plans already issued keep what was set for them.</p>
      </ConfirmDialog>
    </>
  );
}
