const BAR = { left: 40, top: 60, height: 76, right: 940 };
const CUTS = [
  { at: 270, label: `6'-0 1/4"` },
  { at: 500, label: `12'-0 1/4"` },
  { at: 660, label: `16'-2 3/4"` },
];
const TICKS = Array.from({ length: 77 }, (_, i) => BAR.left + i * 11.5);

/** A bar laid out on the blue: pieces, nicks, tape and the drop's tag. An ornament, so hidden from screen readers. */
export function BarDrawing() {
  const bottom = BAR.top + BAR.height;
  const middle = BAR.top + BAR.height / 2;
  return (
    <svg
      aria-hidden
      viewBox="0 0 1000 250"
      className="w-full"
      fill="none"
      stroke="currentColor"
      strokeWidth="2.5"
    >
      <path d={`M660 ${BAR.top} H${BAR.left} V${bottom} H660`} />
      <path
        d={`M660 ${BAR.top} H${BAR.right - 26} L${BAR.right} ${middle} L${BAR.right - 26} ${bottom} H660`}
        className="fill-white/10"
      />
      <circle cx={BAR.right - 30} cy={middle} r="7" strokeWidth="2" />
      <path d={`M${BAR.left - 9} ${bottom + 18} h18 l-9 -15 z`} fill="currentColor" stroke="none" />
      {CUTS.map(({ at }) => (
        <path
          key={at}
          d={`M${at - 6} ${BAR.top - 8} l6 10 l6 -10 M${at} ${BAR.top} V${bottom} M${at - 6} ${bottom + 8} l6 -10 l6 10`}
        />
      ))}
      <g
        fill="currentColor"
        stroke="none"
        className="font-mono"
        textAnchor="middle"
        fontSize="24"
        fontWeight="700"
      >
        <text x="155" y={middle + 9}>
          B-104
        </text>
        <text x="385" y={middle + 9}>
          B-104
        </text>
        <text x="580" y={middle + 9}>
          B-107
        </text>
      </g>
      <text x="690" y={middle + 8} fill="currentColor" stroke="none" className="font-mono" fontSize="21">
        D-0413
      </text>
      <rect
        x={BAR.left}
        y="172"
        width={BAR.right - BAR.left}
        height="30"
        className="fill-white/10"
        strokeWidth="1"
      />
      {TICKS.map((x, i) => (
        <path key={x} d={`M${x} 172 v${i % 5 === 0 ? 13 : 6}`} strokeWidth="1.2" />
      ))}
      {CUTS.map(({ at, label }) => (
        <g key={label}>
          <path d={`M${at} 160 V218`} strokeWidth="2" />
          <text
            x={at - 7}
            y="232"
            textAnchor="end"
            fill="currentColor"
            stroke="none"
            className="font-mono"
            fontSize="17"
          >
            {label}
          </text>
        </g>
      ))}
    </svg>
  );
}
