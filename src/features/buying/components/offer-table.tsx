import type { Offer } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { useFormats } from '#src/lib/formats.ts';
import { pricePerMass, pricePerMassUnit } from '#src/features/buying/hooks/price-per-mass.ts';

type OfferTableProps = {
  offers: readonly Offer[];
  mayEdit: boolean;
  onChange: (offer: Offer) => void;
  onDelete: (offer: Offer) => void;
};

export function OfferTable({ offers, mayEdit, onChange, onDelete }: OfferTableProps) {
  const { length, mass, money, date, units, currency } = useFormats();
  const columns: Column<Offer>[] = [
    {
      key: 'section',
      head: 'Section',
      mono: true,
      rowHead: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => offer.section,
    },
    {
      key: 'grade',
      head: 'Grade',
      mono: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => offer.grade || 'any',
    },
    {
      key: 'length',
      head: 'Length',
      align: 'right',
      mono: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => length(offer.lengthNm),
    },
    {
      key: 'price',
      head: 'Price a bar',
      align: 'right',
      mono: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => money(offer.priceMinor),
    },
    {
      key: 'mass',
      head: 'Mass a bar',
      align: 'right',
      mono: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => mass(offer.massMg),
    },
    {
      key: 'perMass',
      head: pricePerMassUnit(units, currency),
      align: 'right',
      mono: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => pricePerMass(offer.priceMinor, offer.massMg, units, currency),
    },
    {
      key: 'supplier',
      head: 'Supplier',
      className: 'sm:min-w-36 sm:pl-4',
      cell: (offer) => offer.supplierName,
    },
    {
      key: 'priced',
      head: 'Priced',
      wideOnly: true,
      className: 'sm:whitespace-nowrap',
      cell: (offer) => date(offer.pricedAt),
    },
    ...(mayEdit
      ? [
          {
            key: 'actions',
            fullLine: true,
            head: <span className="sr-only">Change or delete</span>,
            align: 'right' as const,
            cell: (offer: Offer) => (
              <span className="flex gap-2 sm:justify-end sm:max-lg:flex-col">
                <Button
                  size="small"
                  onClick={() => onChange(offer)}
                  aria-label={`Change ${offer.section} ${length(offer.lengthNm)} of ${offer.supplierName}`}
                >
                  Change
                </Button>
                <Button
                  size="small"
                  variant="quiet"
                  onClick={() => onDelete(offer)}
                  aria-label={`Delete ${offer.section} ${length(offer.lengthNm)} of ${offer.supplierName}`}
                >
                  Delete
                </Button>
              </span>
            ),
          },
        ]
      : []),
  ];
  return <Table caption="Offers" columns={columns} rows={offers} rowKey={(offer) => offer.id} />;
}
