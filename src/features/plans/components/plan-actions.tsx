import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { PlanView } from '#shared/schemas/plans.ts';
import type { Station } from '#shared/schemas/yard.ts';
import { Button, LinkButton } from '#src/components/button.tsx';
import { ConfirmDialog } from '#src/components/dialog.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useToast } from '#src/components/toast.tsx';
import { usePlanWrites } from '#src/features/plans/api/plans.ts';
import { downloadPlanWorkbook } from '#src/features/plans/hooks/plan-workbook.ts';
import { ApiError } from '#src/lib/api-error.ts';
import { countOf } from '#src/lib/formats.ts';
import { paths } from '#src/lib/paths.ts';
import { useShop } from '#src/lib/session.ts';

type Asking = 'issue' | 'withdraw' | 'remove' | null;

/** What may be done with a plan now: print, export, issue, take back. */
export function PlanActions({ view, stations }: { view: PlanView; stations: readonly Station[] }) {
  const { plan } = view;
  const shop = useShop();
  const say = useToast();
  const navigate = useNavigate();
  const writes = usePlanWrites();
  const [asking, setAsking] = useState<Asking>(null);
  const [station, setStation] = useState(String(plan.stationId ?? stations[0]?.id ?? ''));
  const [reason, setReason] = useState('');
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);

  async function go(work: () => Promise<void>, done: string) {
    setBusy(true);
    setFault(null);
    try {
      await work();
      setAsking(null);
      say(done);
    } catch (error) {
      setFault(error instanceof ApiError ? error.message : 'That did not go through. Try again.');
    } finally {
      setBusy(false);
    }
  }
  const ask = (next: Asking) => {
    setFault(null);
    setAsking(next);
  };
  const dialog = { onOpenChange: (open: boolean) => ask(open ? asking : null), busy, error: fault };
  return (
    <>
      <LinkButton to={paths.planPrint(plan.id)}>Print bar maps</LinkButton>
      <Button
        busy={busy && asking === null}
        busyLabel="Writing the file"
        onClick={() => void go(() => downloadPlanWorkbook(view, shop), 'The workbook is written.')}
      >
        Spreadsheet
      </Button>
      {plan.can['bar:cut'] && <LinkButton to={paths.benchPlan(plan.id)}>To the bench</LinkButton>}
      {plan.can['plan:withdraw'] && plan.state === 'issued' && (
        <Button onClick={() => ask('withdraw')}>Withdraw</Button>
      )}
      {plan.can['plan:remove'] && <Button onClick={() => ask('remove')}>Delete draft</Button>}
      {plan.can['plan:issue'] && (
        <Button variant="act" onClick={() => ask('issue')}>
          Issue
        </Button>
      )}
      <ConfirmDialog
        {...dialog}
        open={asking === 'issue'}
        title={`Issue plan ${plan.number}`}
        confirmLabel="Issue"
        onConfirm={() =>
          void go(
            () => writes.issue(plan.id, { stationId: Number(station), version: plan.version }),
            `Plan ${plan.number} is issued.`,
          )
        }
      >
        <p className="mb-3">
          {plan.dropsUsed === 0
            ? 'No drop is used.'
            : `${countOf(plan.dropsUsed, 'drop is', 'drops are')} held for it, all or none.`}{' '}
          The station can cut from then on.
        </p>
        <SelectField
          label="Station"
          value={station}
          onChange={(event) => setStation(event.target.value)}
          choices={stations.map(({ id, name }) => ({ value: String(id), label: name }))}
        />
      </ConfirmDialog>
      <ConfirmDialog
        {...dialog}
        open={asking === 'withdraw'}
        title={`Withdraw plan ${plan.number}`}
        confirmLabel="Withdraw"
        tone="danger"
        onConfirm={() =>
          void go(
            () => writes.withdraw(plan.id, { reason, version: plan.version }),
            `Plan ${plan.number} is withdrawn.`,
          )
        }
      >
        <p className="mb-3">Held drops go back to the rack and the pieces are open again.</p>
        <TextField
          label="Why"
          maxLength={200}
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        />
      </ConfirmDialog>
      <ConfirmDialog
        {...dialog}
        open={asking === 'remove'}
        title={`Delete the draft ${plan.number}`}
        confirmLabel="Delete"
        tone="danger"
        onConfirm={() =>
          void go(async () => {
            await writes.remove(plan.id);
            await navigate(paths.plans());
          }, `The draft ${plan.number} is deleted.`)
        }
      >
        <p>The pieces are open again. A draft holds no drops.</p>
      </ConfirmDialog>
    </>
  );
}
