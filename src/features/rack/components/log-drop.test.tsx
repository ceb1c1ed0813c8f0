// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { NM_PER_FOOT } from '#shared/domain/units.ts';
import type { SessionView } from '#shared/schemas/people.ts';
import type { DropView } from '#shared/schemas/rack.ts';
import { LogDrop } from '#src/features/rack/components/log-drop.tsx';
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
  person: { id: 'p1', name: 'Joel Mbeki', email: 'joel@harrowbend.example', role: 'yard' },
  can: {},
};

const LOGGED: DropView = {
  drop: {
    id: 40,
    tag: 415,
    section: 'L3x3x1/4',
    stockKey: 'L3x3x1/4',
    family: 'angle',
    grade: 'A36',
    lengthNm: 1_149_350_000,
    widthNm: null,
    massMg: 8_400_000,
    slot: 'B-3-2',
    heat: null,
    note: '',
    state: 'racked',
    heldByPlan: null,
    from: null,
    loggedBy: 'Joel Mbeki',
    loggedAt: '2026-12-01T09:00:00.000Z',
    version: 1,
    can: {},
  },
  events: [],
  children: [],
};

const sent: unknown[] = [];
const onLogged = vi.fn();

beforeEach(() => {
  sent.length = 0;
  onLogged.mockReset();
  vi.stubGlobal('fetch', (_url: string, init: { body: string }) => {
    sent.push(JSON.parse(init.body));
    return Promise.resolve(Response.json(LOGGED, { status: 201 }));
  });
  const client = new QueryClient();
  client.setQueryData(sessionQuery.queryKey, SESSION);
  render(
    <QueryClientProvider client={client}>
      <LogDrop
        recent={[{ section: 'L3x3x1/4', grade: 'A36' }]}
        rules={[{ family: 'angle', keepFromNm: 2 * NM_PER_FOOT, creditPercent: 60, version: 1 }]}
        lastSlot="B-3-2"
        onLogged={onLogged}
      />
    </QueryClientProvider>,
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const type = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const rackIt = () => fireEvent.click(screen.getByRole('button', { name: 'Rack it' }));

describe('LogDrop', () => {
  it('racks a recent section in a touch, a length and an unknown heat', async () => {
    fireEvent.click(screen.getByLabelText('L3x3x1/4'));
    type('Length', `3'-9 1/4"`);
    fireEvent.click(screen.getByLabelText('unknown'));
    rackIt();
    await waitFor(() => expect(onLogged).toHaveBeenCalledWith(LOGGED.drop));
    // 3'-9 1/4" = 45.25 in = 1 149 350 000 nm
    expect(sent).toEqual([
      {
        section: 'L3x3x1/4',
        grade: 'A36',
        lengthNm: 1_149_350_000,
        widthNm: null,
        slot: 'B-3-2',
        heat: null,
        note: '',
      },
    ]);
  });

  it('reads another section in any spelling', async () => {
    fireEvent.click(screen.getByLabelText('other…'));
    type('Other section', 'c6 x 8.2');
    type('Length', '42');
    fireEvent.click(screen.getByLabelText('read off the steel'));
    type('Heat as it stands on the steel', '47K210');
    rackIt();
    await waitFor(() => expect(onLogged).toHaveBeenCalledOnce());
    expect(sent[0]).toMatchObject({ section: 'C6x8.2', lengthNm: 1_066_800_000, heat: '47K210' });
  });

  it('sends nothing while the heat is neither read nor called unknown', async () => {
    fireEvent.click(screen.getByLabelText('L3x3x1/4'));
    type('Length', '42');
    rackIt();
    expect((await screen.findByRole('alert')).textContent).toBe('Choose one.');
    expect(sent).toEqual([]);
  });

  it('says when a drop is shorter than the shop keeps', async () => {
    fireEvent.click(screen.getByLabelText('L3x3x1/4'));
    type('Length', '18');
    expect(await screen.findByText(/Shorter than this shop keeps: from 2'-0"/)).toBeTruthy();
  });
});
