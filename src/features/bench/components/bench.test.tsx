// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { NM_PER_FOOT, NM_PER_INCH } from '#shared/domain/units.ts';
import { canOf } from '#shared/permissions.ts';
import type { SessionView } from '#shared/schemas/people.ts';
import type { Bar, PlanStock, PlanSummary, PlanView } from '#shared/schemas/plans.ts';
import { Bench } from '#src/features/bench/components/bench.tsx';
import { sessionQuery } from '#src/lib/session.ts';

const SESSION: SessionView = {
  needsSetUp: false,
  trial: true,
  demoSignIns: [],
  shop: {
    name: 'Harrow Bend Steelworks',
    units: 'imperial',
    inchDenominator: 16,
    currency: 'USD',
    paper: 'letter',
    handlingMassMg: 22_680_000,
    scrapMinorPerTonne: 0,
    version: 1,
  },
  person: { id: 'p1', name: 'Dana Whitlow', email: 'dana@harrowbend.example', role: 'operator' },
  can: canOf('operator'),
};

const NEW_BAR: PlanStock = {
  stockId: 'offer:1',
  source: 'new',
  lengthNm: 20 * NM_PER_FOOT,
  costMinor: 9800,
  supplierName: 'Cold Fork Steel Supply',
  drop: null,
};
const RACKED: PlanStock = {
  stockId: 'drop:5',
  source: 'drop',
  lengthNm: 8 * NM_PER_FOOT,
  costMinor: 1000,
  supplierName: null,
  drop: { id: 5, tag: 392, slot: 'B-1-2', heat: '47K210' },
};

const PLAN: PlanSummary = {
  id: 2,
  number: 118,
  name: 'stairs',
  state: 'cutting',
  jobs: [],
  stationId: 1,
  stationName: 'Shear 2',
  groups: 1,
  pieces: 3,
  bars: 2,
  barsCut: 0,
  newBars: 1,
  dropsUsed: 1,
  netMinor: 0,
  boundMinor: 0,
  createdBy: 'Tom Ridgeway',
  createdAt: '2026-11-28T10:42:00.000Z',
  issuedAt: '2026-11-29T07:10:00.000Z',
  version: 3,
  can: {},
};

const BAR: Bar = {
  id: 31,
  groupId: 'L3x3x1/4|A36',
  layout: 0,
  number: 1,
  state: 'waiting',
  heat: null,
  makesTag: 415,
  madeDrop: null,
  cutBy: null,
  cutAt: null,
  version: 4,
};

const CROP = NM_PER_INCH / 4;
const VIEW: PlanView = {
  plan: PLAN,
  bars: [BAR, { ...BAR, id: 32, number: 2, layout: 1, makesTag: null }],
  groups: [
    {
      id: 'L3x3x1/4|A36',
      section: 'L3x3x1/4',
      stockKey: 'L3x3x1/4',
      family: 'angle',
      grade: 'A36',
      mgPerM: 7_290_000,
      pieces: [
        {
          id: '7',
          partLineId: 7,
          mark: 'B-104',
          jobNumber: '2407',
          partListName: 'stairs',
          revision: 'C',
          row: 9,
          lengthNm: 7 * NM_PER_FOOT,
          quantity: 3,
          pieceMassMg: 15_500_000,
        },
      ],
      stock: [NEW_BAR, RACKED],
      request: {
        id: 'L3x3x1/4|A36',
        kind: 'linear',
        pieces: [],
        stock: [],
        cutting: { kerfNm: 0, headCropNm: CROP, tailCropNm: 0, holdDownNm: 0 },
        drops: { keepFromNm: NM_PER_FOOT, creditMinorPerM: 0, scrapMinorPerM: 0 },
      },
      result: {
        id: 'L3x3x1/4|A36',
        outcome: 'proven',
        netCostMinor: 0,
        boundMinor: 0,
        gap: 0,
        layouts: [
          {
            stockId: 'offer:1',
            repeat: 1,
            cuts: [0, 1].map((i) => ({
              pieceId: '7',
              startNm: CROP + i * 7 * NM_PER_FOOT,
              lengthNm: 7 * NM_PER_FOOT,
            })),
            leftoverNm: 6 * NM_PER_FOOT - CROP,
            keeps: true,
          },
          {
            stockId: 'drop:5',
            repeat: 1,
            cuts: [{ pieceId: '7', startNm: CROP, lengthNm: 7 * NM_PER_FOOT }],
            leftoverNm: NM_PER_FOOT - CROP,
            keeps: false,
          },
        ],
        unplaced: [],
        counts: { bars: 2, newBars: 1, dropsUsed: 1, layouts: 2 },
        work: { columns: 0, lpRuns: 0, dives: 0, enumerated: 0, elapsedMs: 0 },
      },
    },
  ],
};

const sent: { url: string; body: unknown }[] = [];

function show(bar: Bar | null, onNextBar = vi.fn(), mayCut = true) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  client.setQueryData(sessionQuery.queryKey, SESSION);
  render(
    <QueryClientProvider client={client}>
      <MemoryRouter>
        <Bench
          view={VIEW}
          bar={bar}
          station={null}
          mayCut={mayCut}
          drawing={(_bar, _group, cut) => <i>cut {cut ?? 'none'}</i>}
          onNextBar={onNextBar}
        />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return onNextBar;
}

const press = (name: string) => fireEvent.click(screen.getByRole('button', { name }));
const enabled = (name: string) => !screen.getByRole<HTMLButtonElement>('button', { name }).disabled;

beforeEach(() => {
  sessionStorage.clear();
  sent.length = 0;
  vi.stubGlobal('fetch', (url: string, init: { body: string }) => {
    sent.push({ url, body: JSON.parse(init.body) as unknown });
    return Promise.resolve(
      Response.json({
        bar: {
          ...BAR,
          state: 'cut',
          madeDrop: { id: 40, tag: 415, slot: 'B-3-2' },
          cutAt: '2026-12-01T09:00:00.000Z',
          version: 5,
        },
        plan: PLAN,
      }),
    );
  });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('Bench', () => {
  it('takes a new bar from the pull to the tag, and tells the shop once', async () => {
    const onNextBar = show(BAR);
    expect(screen.getByText(`20'-0"`)).toBeTruthy();
    expect(enabled('It is on the machine')).toBe(false);
    fireEvent.click(screen.getByLabelText('read off the bar'));
    expect(enabled('It is on the machine')).toBe(false);
    fireEvent.change(screen.getByLabelText('Heat as it stands on the bar'), {
      target: { value: ' 47K233 ' },
    });
    press('It is on the machine');

    expect(screen.getByText('Square the end, take off')).toBeTruthy();
    press('Cut done');
    expect(screen.getByText('Set stop to')).toBeTruthy();
    expect(screen.getByText(/Tape from the datum 7'-0 1\/4"/)).toBeTruthy();
    expect(screen.getByText(/1 of 3 of this mark/)).toBeTruthy();
    expect(screen.getByText('cut 0')).toBeTruthy();
    press('Cut done');
    expect(screen.getByText('Stop stays at')).toBeTruthy();
    press('Cut done');

    expect(screen.getByText('D-0415')).toBeTruthy();
    expect(enabled('Bar is cut')).toBe(false);
    fireEvent.change(screen.getByLabelText('Slot it goes to'), { target: { value: 'B-3-2' } });
    press('Bar is cut');
    await waitFor(() => expect(onNextBar).toHaveBeenCalledOnce());
    expect(sent.filter(({ url }) => url.endsWith('/cut'))).toEqual([
      { url: '/api/bars/31/cut', body: { heat: '47K233', slot: 'B-3-2', version: 4 } },
    ]);
  });

  it('sends an unknown heat as unknown, only when it was said', async () => {
    const onNextBar = show(BAR);
    fireEvent.click(screen.getByLabelText('unknown'));
    press('It is on the machine');
    press('All cuts are done');
    fireEvent.change(screen.getByLabelText('Slot it goes to'), { target: { value: 'C-1-1' } });
    fireEvent.change(screen.getByLabelText('Measured length, if it differs'), {
      target: { value: `5'-11"` },
    });
    press('Bar is cut');
    await waitFor(() => expect(onNextBar).toHaveBeenCalledOnce());
    expect(sent[0]?.body).toEqual({ heat: null, slot: 'C-1-1', measuredNm: 71 * NM_PER_INCH, version: 4 });
  });

  it('pulls a drop by tag and slot, and leaves its heat alone', async () => {
    const second = VIEW.bars[1];
    if (!second) throw new Error('the view has two bars');
    const onNextBar = show(second);
    expect(screen.getByText('D-0392')).toBeTruthy();
    expect(screen.getByText('B-1-2')).toBeTruthy();
    press('It is on the machine');
    press('All cuts are done');
    expect(screen.getByText('What is left goes to scrap.')).toBeTruthy();
    press('Bar is cut');
    await waitFor(() => expect(onNextBar).toHaveBeenCalledOnce());
    expect(sent[0]).toEqual({ url: '/api/bars/32/cut', body: { version: 4 } });
  });

  it('keeps how far the bar is through a reload', () => {
    show(BAR);
    fireEvent.click(screen.getByLabelText('unknown'));
    press('It is on the machine');
    press('Cut done');
    cleanup();
    show(BAR);
    expect(screen.getByText('Set stop to')).toBeTruthy();
  });

  it('says what went wrong beside the button and loses nothing', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('no network')));
    show(BAR);
    fireEvent.click(screen.getByLabelText('unknown'));
    press('It is on the machine');
    press('All cuts are done');
    fireEvent.change(screen.getByLabelText('Slot it goes to'), { target: { value: 'C-1-1' } });
    press('Bar is cut');
    expect((await screen.findByRole('alert')).textContent).toContain('No connection to the shop');
    expect(screen.getByLabelText<HTMLInputElement>('Slot it goes to').value).toBe('C-1-1');
    expect(enabled('Bar is cut')).toBe(true);
  });

  it('warns where the bar is heavier than one person lifts', () => {
    show(BAR);
    expect(screen.getByText(/Lift with help: the bar weighs/)).toBeTruthy();
    expect(screen.getByText(/hands clear/)).toBeTruthy();
  });

  it('offers no cutting to a role that may not cut', () => {
    show(BAR, vi.fn(), false);
    expect(screen.queryByRole('button', { name: 'It is on the machine' })).toBeNull();
    expect(screen.getByText('2 of 2 bars are still to cut')).toBeTruthy();
  });

  it('says when every bar is cut', () => {
    show(null);
    expect(screen.getByText('Every bar of this plan is cut')).toBeTruthy();
  });
});
