import { useState } from 'react';
import type { DropRule } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { Dialog } from '#src/components/dialog.tsx';
import { Table, type Column } from '#src/components/table.tsx';
import { useToast } from '#src/components/toast.tsx';
import { FAMILY_WORDS } from '#src/lib/family-words.ts';
import { useFormats } from '#src/lib/formats.ts';
import { DropRuleForm } from '#src/features/shop/components/drop-rule-form.tsx';

type DropRuleListProps = { rules: readonly DropRule[]; mayEdit: boolean };

export function DropRuleList({ rules, mayEdit }: DropRuleListProps) {
  const say = useToast();
  const { length } = useFormats();
  const [changing, setChanging] = useState<DropRule | null>(null);
  const columns: Column<DropRule>[] = [
    {
      key: 'family',
      head: 'Section',
      rowHead: true,
      cell: (rule) => (
        <span className="font-semibold first-letter:uppercase">{FAMILY_WORDS[rule.family]}</span>
      ),
    },
    {
      key: 'keep',
      head: 'Keep drops from',
      align: 'right',
      mono: true,
      cell: (rule) => length(rule.keepFromNm),
    },
    {
      key: 'credit',
      head: 'Worth, of new price',
      align: 'right',
      mono: true,
      cell: (rule) => `${rule.creditPercent} %`,
    },
    ...(mayEdit
      ? [
          {
            key: 'actions',
            fullLine: true,
            head: <span className="sr-only">Change</span>,
            align: 'right' as const,
            cell: (rule: DropRule) => (
              <Button
                size="small"
                onClick={() => setChanging(rule)}
                aria-label={`Change the rule for ${FAMILY_WORDS[rule.family]}`}
              >
                Change
              </Button>
            ),
          },
        ]
      : []),
  ];
  return (
    <div className="max-w-3xl">
      <Table
        caption="Drops worth keeping, by kind of section"
        columns={columns}
        rows={rules}
        rowKey={(rule) => rule.family}
      />
      <Dialog
        open={changing !== null}
        onOpenChange={(open) => {
          if (!open) setChanging(null);
        }}
        title={changing ? `Drops of ${FAMILY_WORDS[changing.family]}` : ''}
      >
        {changing && (
          <DropRuleForm
            rule={changing}
            onSaved={() => {
              say(`The rule for ${FAMILY_WORDS[changing.family]} is saved.`);
              setChanging(null);
            }}
          />
        )}
      </Dialog>
    </div>
  );
}
