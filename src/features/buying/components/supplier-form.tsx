import { SupplierInput, type Supplier } from '#shared/schemas/yard.ts';
import { Button } from '#src/components/button.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextAreaField, TextField } from '#src/components/text-field.tsx';
import { useEditForm } from '#src/lib/use-edit-form.ts';
import { useSupplierWrites } from '#src/features/buying/api/suppliers.ts';

type SupplierFormProps = { supplier: Supplier | null; onSaved: (supplier: Supplier) => void };

export function SupplierForm({ supplier, onSaved }: SupplierFormProps) {
  const writes = useSupplierWrites();
  const { form, onSubmit, fault, saving, errors } = useEditForm<
    SupplierInput,
    SupplierInput,
    Supplier | null,
    Supplier
  >({
    schema: SupplierInput,
    thing: supplier,
    toForm: (current) =>
      current
        ? { name: current.name, email: current.email, note: current.note, version: current.version }
        : { name: '', email: '', note: '' },
    fields: ['name', 'email', 'note'],
    save: (input) => writes.save(supplier?.id ?? null, input),
    ...(supplier ? { reload: () => writes.reload(supplier.id) } : {}),
    onSaved,
  });
  return (
    <form noValidate onSubmit={onSubmit} className="grid gap-5">
      <TextField label="Name" autoComplete="off" error={errors.name?.message} {...form.register('name')} />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="off"
        hint="May stay empty."
        error={errors.email?.message && 'That is not an e-mail address.'}
        {...form.register('email')}
      />
      <TextAreaField
        label="Note"
        hint="Minimum order, days to deliver, whom to ring."
        error={errors.note?.message}
        {...form.register('note')}
      />
      {fault && (
        <Notice tone="fault" live>
          {fault}
        </Notice>
      )}
      <div>
        <Button type="submit" variant="act" busy={saving} busyLabel="Saving">
          Save supplier
        </Button>
      </div>
    </form>
  );
}
