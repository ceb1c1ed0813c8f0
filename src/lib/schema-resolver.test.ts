import { describe, expect, it } from 'vitest';
import { OfferInput, StationInput, SupplierInput } from '#shared/schemas/yard.ts';
import { schemaResolver } from '#src/lib/schema-resolver.ts';

const options = { fields: {}, shouldUseNativeValidation: false } as const;

describe('schemaResolver', () => {
  it('gives the values as the schema reads them', async () => {
    const read = await schemaResolver(SupplierInput)(
      { name: '  Cold Fork  ', email: '', note: '' },
      undefined,
      options,
    );
    expect(read).toEqual({ values: { name: 'Cold Fork', email: '', note: '' }, errors: {} });
  });

  it('asks for every empty field at once, in plain words', async () => {
    const { errors } = await schemaResolver(OfferInput)(
      { supplierId: 1, section: null, grade: '', lengthNm: null, priceMinor: null },
      undefined,
      options,
    );
    expect(errors).toEqual({
      section: { type: 'invalid_type', message: 'Fill this in.' },
      lengthNm: { type: 'invalid_type', message: 'Fill this in.' },
      priceMinor: { type: 'invalid_type', message: 'Fill this in.' },
    });
  });

  it('keeps the words the shop has written into the schema', async () => {
    const { errors } = await schemaResolver(StationInput)(
      {
        name: 'Shear 2',
        method: 'shear',
        kerfNm: 2_540_000,
        headCropNm: 0,
        tailCropNm: 0,
        holdDownNm: 0,
        longestStopNm: null,
        families: ['angle'],
        note: '',
      },
      undefined,
      options,
    );
    expect(errors).toEqual({
      kerfNm: { type: 'custom', message: 'A shear parts the bar without kerf: leave it at 0.' },
    });
  });

  it('asks for at least one where a list is empty', async () => {
    const { errors } = await schemaResolver(StationInput)(
      {
        name: 'Saw',
        method: 'saw',
        kerfNm: 1,
        headCropNm: 0,
        tailCropNm: 0,
        holdDownNm: 0,
        longestStopNm: null,
        families: [],
        note: '',
      },
      undefined,
      options,
    );
    expect(errors).toMatchObject({ families: { message: 'Choose at least one.' } });
  });
});
