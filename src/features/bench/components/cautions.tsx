import { Notice } from '#src/components/notice.tsx';

type CautionsProps = {
  method: 'shear' | 'saw' | 'thermal' | null;
  /** Bar or piece is heavier than the shop lets one person lift; the mass in words. */
  heavy: string | null;
};

const BY_METHOD = {
  shear: 'Guards and hold-down in place, hands clear of the blade.',
  saw: 'Guards and vise in place, hands clear of the blade.',
  thermal: 'Screens in place, nobody near the sparks, hands clear of hot steel.',
} as const;

/** Short words where work can hurt; they stand on every bar. */
export function Cautions({ method, heavy }: CautionsProps) {
  return (
    <Notice tone="caution">
      <p className="text-lg">
        {heavy && <strong className="font-semibold">Lift with help: {heavy}. </strong>}
        {method ? BY_METHOD[method] : 'Guards and hold-down in place, hands clear.'} Support the bar, keep the
        tail end clear of people. Eye, ear, hand and foot protection on. Lock out before clearing a jam. The
        maker&rsquo;s plate on the machine governs. Masses are nominal.
      </p>
    </Notice>
  );
}
