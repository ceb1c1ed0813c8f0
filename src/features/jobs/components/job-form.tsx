import { JobInput, type Job } from '#shared/schemas/jobs.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useJobWrites } from '#src/features/jobs/api/jobs.ts';

type JobFormProps = { job: Job | null; onSaved: (job: Job) => void };

/** A new job, or the change of one. */
export function JobForm({ job, onSaved }: JobFormProps) {
  const writes = useJobWrites();
  const { form, onSubmit, fault, saving, errors } = useEditForm<JobInput, JobInput, Job | null, Job>({
    schema: JobInput,
    thing: job,
    toForm: (current) =>
      current
        ? {
            number: current.number,
            name: current.name,
            customer: current.customer,
            version: current.version,
          }
        : { number: '', name: '', customer: '' },
    fields: ['number', 'name', 'customer'],
    save: (input) => writes.save(job?.id ?? null, input),
    ...(job ? { reload: () => writes.reload(job.id) } : {}),
    onSaved,
  });
  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <TextField
        label="Number"
        mono
        required
        autoComplete="off"
        hint="As it stands on the drawings."
        error={errors.number?.message}
        {...form.register('number')}
      />
      <TextField
        label="Name"
        required
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextField
        label="Customer"
        autoComplete="off"
        hint="May stay empty."
        error={errors.customer?.message}
        {...form.register('customer')}
      />
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          {job ? 'Save job' : 'Make the job'}
        </Button>
      </div>
    </form>
  );
}
