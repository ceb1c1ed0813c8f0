import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Offer, Supplier } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { ConfirmDialog, Dialog } from '#src/components/dialog.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { useToast } from '#src/components/toast.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { countOf } from '#src/lib/formats.ts';
import { paths, withSearch } from '#src/lib/paths.ts';
import { useDeleteSupplier } from '#src/features/buying/api/suppliers.ts';
import { SupplierForm } from '#src/features/buying/components/supplier-form.tsx';

type SuppliersProps = {
  suppliers: readonly Supplier[];
  offers: readonly Offer[];
  mayEdit: boolean;
  adding: boolean;
  onAddingChange: (adding: boolean) => void;
};

export function Suppliers({ suppliers, offers, mayEdit, adding, onAddingChange }: SuppliersProps) {
  const say = useToast();
  const [changing, setChanging] = useState<Supplier | null>(null);
  const [deleting, setDeleting] = useState<Supplier | null>(null);
  const remove = useDeleteSupplier();
  const offersOf = (supplier: Supplier) => offers.filter((offer) => offer.supplierId === supplier.id).length;

  const columns: Column<Supplier>[] = [
    {
      key: 'name',
      head: 'Supplier',
      rowHead: true,
      className: 'sm:min-w-36',
      cell: (supplier) => <span className="font-semibold">{supplier.name}</span>,
    },
    {
      key: 'offers',
      head: 'Offers',
      align: 'right',
      cell: (supplier) => (
        <Link
          to={withSearch(paths.buying(), { supplier: supplier.id })}
          aria-label={`${offersOf(supplier)} offers of ${supplier.name}`}
          className="inline-block px-2 py-1.5 font-mono text-layout underline underline-offset-4"
        >
          {offersOf(supplier)}
        </Link>
      ),
    },
    {
      key: 'email',
      head: 'E-mail',
      className: 'sm:pl-4',
      cell: (supplier) =>
        supplier.email ? (
          <a href={`mailto:${supplier.email}`} className="break-all text-layout underline underline-offset-4">
            {supplier.email}
          </a>
        ) : (
          <span className="text-muted">none</span>
        ),
    },
    {
      key: 'note',
      head: 'Note',
      className: 'sm:min-w-44',
      cell: (supplier) => <span className="break-words text-muted">{supplier.note || 'none'}</span>,
    },
    ...(mayEdit
      ? [
          {
            key: 'actions',
            fullLine: true,
            head: <span className="sr-only">Change or delete</span>,
            align: 'right' as const,
            cell: (supplier: Supplier) => (
              <span className="flex gap-2 sm:justify-end">
                <Button
                  size="small"
                  onClick={() => setChanging(supplier)}
                  aria-label={`Change ${supplier.name}`}
                >
                  Change
                </Button>
                <Button
                  size="small"
                  variant="quiet"
                  onClick={() => setDeleting(supplier)}
                  aria-label={`Delete ${supplier.name}`}
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
      {suppliers.length === 0 ? (
        <EmptyState title="No supplier yet">
          Whoever sells you bar.{' '}
          {mayEdit ? 'Add one, then type its offers.' : 'A purchaser or manager can add one.'}
        </EmptyState>
      ) : (
        <Table caption="Suppliers" columns={columns} rows={suppliers} rowKey={(supplier) => supplier.id} />
      )}
      <Dialog
        open={adding || changing !== null}
        onOpenChange={(open) => {
          if (open) return;
          onAddingChange(false);
          setChanging(null);
        }}
        title={changing?.name ?? 'Add a supplier'}
      >
        <SupplierForm
          key={changing?.id ?? 'new'}
          supplier={changing}
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
        confirmLabel="Delete supplier"
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
        <p>
          {deleting && offersOf(deleting) > 0
            ? `It still has ${countOf(offersOf(deleting), 'offer', 'offers')}.`
            : 'It has no offers.'}
        </p>
      </ConfirmDialog>
    </>
  );
}
