import { useState } from 'react';
import type { Offer, Supplier } from '#shared/schemas/yard.ts';
import { Button, LinkButton } from '#src/components/button.tsx';
import { ConfirmDialog, Dialog } from '#src/components/dialog.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { SearchField } from '#src/components/search-field.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { useToast } from '#src/components/toast.tsx';
import { faultWords } from '#src/lib/api-error.ts';
import { useFormats } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useSearch } from '#src/lib/use-search.ts';
import { useDeleteOffer } from '#src/features/buying/api/offers.ts';
import { OfferForm } from '#src/features/buying/components/offer-form.tsx';
import { OfferTable } from '#src/features/buying/components/offer-table.tsx';
import { filterOffers } from '#src/features/buying/hooks/filter-offers.ts';

type OffersProps = {
  offers: readonly Offer[];
  suppliers: readonly Supplier[];
  mayEdit: boolean;
  adding: boolean;
  onAddingChange: (adding: boolean) => void;
};

export function Offers({ offers, suppliers, mayEdit, adding, onAddingChange }: OffersProps) {
  const say = useToast();
  const { length, money } = useFormats();
  const [get, set] = useSearch();
  const [changing, setChanging] = useState<Offer | null>(null);
  const [deleting, setDeleting] = useState<Offer | null>(null);
  const remove = useDeleteOffer();
  const section = get('section');
  const supplier = get('supplier');
  const shown = filterOffers(offers, { section, supplierId: supplier === '' ? null : Number(supplier) });

  if (suppliers.length === 0)
    return (
      <EmptyState
        title="No supplier yet"
        actions={mayEdit && <LinkButton to={paths.suppliers()}>Add a supplier</LinkButton>}
      >
        An offer is one supplier&rsquo;s price for a bar of a section, grade and length. Add the supplier
        first, then its offers: every plan chooses among them.
      </EmptyState>
    );

  return (
    <>
      {offers.length === 0 ? (
        <EmptyState title="No offer yet">
          Type what your suppliers charge for a bar. A plan can only buy what has a price; lengths usual in
          the trade are suggested where you have none.
        </EmptyState>
      ) : (
        <>
          <div className="mb-4 grid max-w-2xl gap-4 sm:grid-cols-2">
            <SearchField
              label="Section or grade"
              mono
              value={section}
              onSearch={(text) => set({ section: text })}
            />
            <SelectField
              label="Supplier"
              value={supplier}
              onChange={(event) => set({ supplier: event.target.value })}
              choices={[
                { value: '', label: 'all suppliers' },
                ...suppliers.map(({ id, name }) => ({ value: String(id), label: name })),
              ]}
            />
          </div>
          {shown.length === 0 ? (
            <EmptyState
              title="No offer fits"
              actions={
                <Button onClick={() => set({ section: null, supplier: null })}>Show all offers</Button>
              }
            >
              {offers.length} offers are left out by section or supplier.
            </EmptyState>
          ) : (
            <OfferTable offers={shown} mayEdit={mayEdit} onChange={setChanging} onDelete={setDeleting} />
          )}
        </>
      )}
      <Dialog
        open={adding || changing !== null}
        onOpenChange={(open) => {
          if (open) return;
          onAddingChange(false);
          setChanging(null);
        }}
        title={changing ? 'Change an offer' : 'Add an offer'}
      >
        <OfferForm
          key={changing?.id ?? 'new'}
          offer={changing}
          suppliers={suppliers}
          onSaved={(offer) => {
            onAddingChange(false);
            setChanging(null);
            say(`${offer.section} ${length(offer.lengthNm)} at ${money(offer.priceMinor)} is saved.`);
          }}
        />
      </Dialog>
      <ConfirmDialog
        open={deleting !== null}
        onOpenChange={(open) => {
          if (!open) setDeleting(null);
          remove.reset();
        }}
        title="Delete this offer"
        confirmLabel="Delete offer"
        tone="danger"
        busy={remove.isPending}
        error={remove.isError ? faultWords(remove.error).message : null}
        onConfirm={() => {
          if (!deleting) return;
          remove.mutate(deleting.id, {
            onSuccess: () => {
              say(`${deleting.section} ${length(deleting.lengthNm)} of ${deleting.supplierName} is deleted.`);
              setDeleting(null);
            },
          });
        }}
      >
        {deleting && (
          <p>
            <span className="font-mono">
              {deleting.section} {deleting.grade} {length(deleting.lengthNm)}
            </span>{' '}
            of {deleting.supplierName}. New plans will not buy it; plans already saved keep it.
          </p>
        )}
      </ConfirmDialog>
    </>
  );
}
