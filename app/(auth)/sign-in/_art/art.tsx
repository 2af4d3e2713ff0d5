import { dayText, minuteText } from '@/app/_ui/format';
import { utcParts } from '@/src/units/time';
import { StaveDrawing } from './stave-drawing';
import { stavesOf, type Scene } from './scene';
import { FIRST, HEIGHT, LEFT, PITCH, WIDTH, type Across } from './sizes';

const TEN_MINUTES = 600_000;
const COUNT_WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight'];

/** The product in one drawing; without a scene the staves are ruled and nothing stands on them. */
export function Art({ scene }: { scene: Scene | null }) {
  const staves = scene ? stavesOf(scene) : Array.from({ length: 6 }, () => null);
  const foot = FIRST + (staves.length - 1) * PITCH + HEIGHT;
  const across: Across = (ms) =>
    scene
      ? LEFT + ((ms - scene.span.startMs) / (scene.span.endMs - scene.span.startMs)) * (WIDTH - LEFT)
      : LEFT;
  const tops = scene?.scans.map((_, scan) =>
    staves.findIndex((stave) => stave?.notes.some((n) => n.scan === scan)),
  );
  return (
    <div className="art">
      <p className="art-say">
        Far apart,
        <br />
        listening together.
      </p>
      <svg viewBox={`0 170 ${WIDTH} ${foot - 150}`} preserveAspectRatio="xMaxYMin meet" aria-hidden="true">
        {scene && <Hours scene={scene} across={across} foot={foot + 8} />}
        {staves.map((stave, index) => (
          <StaveDrawing
            key={index}
            index={index}
            stave={stave}
            across={across}
            scans={scene?.scans ?? []}
            tops={tops ?? []}
          />
        ))}
      </svg>
      <p className="art-cap">{scene ? caption(scene) : ''}</p>
    </div>
  );
}

function Hours({ scene, across, foot }: { scene: Scene; across: Across; foot: number }) {
  const { startMs, endMs } = scene.span;
  const count = Math.round((endMs - startMs) / TEN_MINUTES);
  return Array.from({ length: count + 1 }, (_, index) => startMs + index * TEN_MINUTES).map((ms, index) => {
    const { hour, minute } = utcParts(ms);
    const isMidnight = hour === 0 && minute === 0;
    const x = Math.round(across(ms)) + 0.5;
    return (
      <g key={ms}>
        <line
          x1={x}
          x2={x}
          y1="190"
          y2={foot}
          stroke={isMidnight ? 'var(--ink)' : minute === 0 ? 'var(--rule)' : 'var(--hair)'}
          strokeWidth={isMidnight ? 1.5 : 1}
        />
        {index % 12 === 0 && index < count && (
          <text x={x + 5} y="198" fontSize={13} fontWeight={600}>
            {String(hour).padStart(2, '0')}
          </text>
        )}
      </g>
    );
  });
}

function caption({ source, stations, span }: Scene): string {
  const count = COUNT_WORDS[stations.length] ?? String(stations.length);
  const time = (ms: number) => `day ${dayText(ms)}, ${minuteText(ms)} UT`;
  return `${source.name} over ${count} invented stations, ${time(span.startMs)} to ${time(span.endMs)}`;
}
