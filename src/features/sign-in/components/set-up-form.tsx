import { useMemo, useState } from 'react';
import { Controller, useForm } from 'react-hook-form';
import { SetUpInput } from '#shared/schemas/people.ts';
import { Button } from '#src/components/button.tsx';
import { ChipField } from '#src/components/chip-field.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { currencyChoices } from '#src/lib/currencies.ts';
import { placeIssues } from '#src/lib/form-issues.ts';
import { schemaResolver } from '#src/lib/schema-resolver.ts';
import { useSetUp } from '#src/features/sign-in/api/set-up.ts';

const FIELDS = ['shopName', 'units', 'currency', 'paper', 'name', 'email', 'password'] as const;

/** The very first page of a new shop: what it measures and pays in, and its first manager. */
export function SetUpForm() {
  const setUp = useSetUp();
  const currencies = useMemo(() => currencyChoices(), []);
  const [rest, setRest] = useState<string | null>(null);
  const form = useForm<SetUpInput>({
    resolver: schemaResolver(SetUpInput),
    defaultValues: {
      shopName: '',
      units: 'imperial',
      currency: 'USD',
      paper: 'letter',
      name: '',
      email: '',
      password: '',
    },
  });
  const { errors } = form.formState;
  const submit = form.handleSubmit((input) => {
    setRest(null);
    setUp.mutate(input, { onError: (error) => setRest(placeIssues(error, FIELDS, form.setError)) });
  });

  return (
    <form noValidate className="grid gap-5" onSubmit={submit}>
      <h2>The shop</h2>
      <TextField
        label="Name of the shop"
        autoComplete="organization"
        error={errors.shopName?.message}
        {...form.register('shopName')}
      />
      <Controller
        control={form.control}
        name="units"
        render={({ field }) => (
          <ChipField
            label="Lengths and masses"
            value={field.value}
            onChange={field.onChange}
            choices={[
              { value: 'imperial', label: 'feet, inches, lb' },
              { value: 'metric', label: 'millimetres, kg' },
            ]}
          />
        )}
      />
      <div className="grid gap-5 sm:grid-cols-2">
        <SelectField
          label="Currency"
          choices={currencies}
          error={errors.currency?.message}
          {...form.register('currency')}
        />
        <Controller
          control={form.control}
          name="paper"
          render={({ field }) => (
            <ChipField
              label="Paper in the printer"
              value={field.value}
              onChange={field.onChange}
              choices={[
                { value: 'letter', label: 'Letter' },
                { value: 'a4', label: 'A4' },
              ]}
            />
          )}
        />
      </div>
      <h2 className="mt-3">You, its first manager</h2>
      <TextField
        label="Your name"
        autoComplete="name"
        error={errors.name?.message}
        {...form.register('name')}
      />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        error={errors.email?.message}
        {...form.register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="new-password"
        hint="At least 10 characters. Length counts more than odd signs."
        error={errors.password?.message}
        {...form.register('password')}
      />
      {rest && (
        <Notice tone="fault" live>
          {rest}
        </Notice>
      )}
      <Button type="submit" variant="act" size="big" busy={setUp.isPending} busyLabel="Opening the shop">
        Open the shop
      </Button>
    </form>
  );
}
