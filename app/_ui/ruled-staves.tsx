const FIRST = 60;
const PITCH = 92;
const HEIGHT = 66;
const LEFT = 92;
const HOURS = 12;
const UNNAMED = 6;

type RuledStavesProps = {
  /** stations in stave order; without them the staves stand unnamed */
  codes?: readonly string[];
};

/** The empty sheet: staves ruled at 0°, 30°, 60° and 90°, nothing on them. */
export function RuledStaves({ codes = [] }: RuledStavesProps) {
  const count = codes.length || UNNAMED;
  const staves = Array.from({ length: count }, (_, index) => FIRST + index * PITCH);
  return (
    <svg className="ruled-staves" height={FIRST + count * PITCH} aria-hidden="true">
      <line x1="0" x2="100%" y1="40.5" y2="40.5" stroke="var(--ink)" />
      <svg x={LEFT} width={`calc(100% - ${LEFT}px)`} height="48" overflow="visible">
        {Array.from({ length: HOURS + 1 }, (_, hour) => `${(hour / HOURS) * 100}%`).map((x) => (
          <line key={x} x1={x} x2={x} y1="28" y2="40" stroke="var(--rule)" />
        ))}
      </svg>
      {staves.map((y, index) => (
        <g key={y}>
          {[0, 22, 44].map((below) => (
            <line
              key={below}
              x1={LEFT - 6}
              x2="100%"
              y1={y + below + 0.5}
              y2={y + below + 0.5}
              stroke="var(--rule)"
              strokeWidth={0.75}
            />
          ))}
          <line x1={LEFT - 6} x2="100%" y1={y + HEIGHT + 0.5} y2={y + HEIGHT + 0.5} stroke="var(--ink)" />
          <line x1={LEFT - 0.5} x2={LEFT - 0.5} y1={y} y2={y + HEIGHT} stroke="var(--ink)" />
          <text
            className="s"
            x="12"
            y={y + 24}
            fontSize={19}
            fontWeight={600}
            style={{ fill: 'var(--ink3)' }}
          >
            {codes[index] ?? ''}
          </text>
        </g>
      ))}
    </svg>
  );
}
