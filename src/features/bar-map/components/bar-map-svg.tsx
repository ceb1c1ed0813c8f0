import type { BarMap, Fill, Shape, Tone } from '#shared/domain/bar-map/shapes.ts';

const TONES: Readonly<Record<Tone, string>> = { ink: '#000', cut: '#000', faint: '#444' };
const FILLS: Readonly<Record<Fill, string>> = { none: 'none', ink: '#000', chalk: '#fff', soap: '#fff' };

function Drawn({ shape }: { shape: Shape }) {
  switch (shape.kind) {
    case 'line':
      return (
        <line
          x1={shape.x1}
          y1={shape.y1}
          x2={shape.x2}
          y2={shape.y2}
          stroke={TONES[shape.tone]}
          strokeWidth={shape.weight}
        />
      );
    case 'polygon':
      return (
        <polygon
          points={shape.points.map((point) => point.join(',')).join(' ')}
          fill={FILLS[shape.fill]}
          stroke={shape.weight > 0 ? '#000' : 'none'}
          strokeWidth={shape.weight}
        />
      );
    case 'circle':
      return (
        <circle
          cx={shape.cx}
          cy={shape.cy}
          r={shape.r}
          fill={FILLS[shape.fill]}
          stroke={shape.weight > 0 ? '#000' : 'none'}
          strokeWidth={shape.weight}
        />
      );
    case 'text':
      return (
        <text
          x={shape.x}
          y={shape.y}
          fontSize={shape.size}
          fontWeight={shape.bold ? (shape.font === 'head' ? 600 : 700) : 400}
          fontFamily={shape.font === 'mono' ? 'JetBrains Mono' : 'Barlow Condensed'}
          textAnchor={shape.align === 'left' ? 'start' : shape.align === 'right' ? 'end' : 'middle'}
          fill={TONES[shape.tone]}
        >
          {shape.text}
        </text>
      );
  }
}

/** A bar map for paper, in true millimetres: vector, so that it stays sharp and its words can be searched. Black on white. */
export function BarMapSvg({ map, label }: { map: BarMap; label: string }) {
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={`0 0 ${map.width} ${map.height}`}
      style={{ width: `${map.width}mm`, height: `${map.height}mm`, display: 'block' }}
    >
      {map.shapes.map((shape, i) => (
        <Drawn key={i} shape={shape} />
      ))}
    </svg>
  );
}
