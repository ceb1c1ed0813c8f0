import { Tape } from '#src/components/tape.tsx';
import { useFormats } from '#src/lib/formats.ts';

/** The two marks that close on each other: what the plan costs and what no plan can cost less than. */
export function BoundTape({
  netMinor,
  boundMinor,
  words,
}: {
  netMinor: number;
  boundMinor: number;
  words: string;
}) {
  const { money } = useFormats();
  // The tape shows the neighbourhood of the plan, so that a gap of a per cent can be seen at all.
  const span = Math.max(netMinor - boundMinor, netMinor * 0.004, 1);
  const from = Math.max(0, netMinor - span * 7);
  const to = netMinor + span * 4;
  const step = (to - from) / 80;
  return (
    <Tape
      label={`No plan can cost less than ${money(boundMinor)}. This plan costs ${money(netMinor)}: ${words}.`}
      from={from}
      to={to}
      minor={step}
      major={step * 10}
      marks={[
        {
          key: 'bound',
          at: boundMinor,
          kind: 'bound',
          label: `no plan costs less than ${money(boundMinor)}`,
          side: 'left',
        },
        {
          key: 'net',
          at: netMinor,
          kind: 'cut',
          label: `this plan ${money(netMinor)}, ${words}`,
          side: 'right',
        },
      ]}
    />
  );
}
