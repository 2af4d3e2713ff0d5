import type { SessionChoices } from '@/src/data/session/choices';
import { readBlock } from '@/src/exchange/catalogue/block';
import { WHEN, RULES, type SessionTyped } from '@/src/exchange/session-form';
import { prospectOf, type Prospect } from '@/src/outlook/prospect';

export type Overlap = SessionChoices['taken'][number];

export type Standing = {
  startMs: number;
  endMs: number;
  prospect: Prospect;
  /** what the chosen stations do at the same time */
  overlaps: readonly Overlap[];
};

const LOWEST_DEG = 0;

/** What can be worked out from the form as it is typed; null until there is a time. */
export function standingOf(typed: SessionTyped, choices: SessionChoices): Standing | null {
  const when = readBlock(WHEN, typed.when);
  if (!when.ok) return null;
  const rules = readBlock(RULES, typed.rules);
  const { startMs, lengthSeconds } = when.value;
  const endMs = startMs + lengthSeconds * 1000;
  const mode = choices.modes.find(({ id }) => id === typed.modeId);
  return {
    startMs,
    endMs,
    prospect: prospectOf({
      stations: choices.stations.filter(({ code }) => typed.stations.includes(code)),
      sources: typed.sources.flatMap(({ id }) => {
        const source = choices.sources.find((one) => one.id === id);
        return source ? [{ id, position: source.position, isTarget: source.role === 'target' }] : [];
      }),
      span: { start: new Date(startMs), end: new Date(endMs) },
      minElevationDeg: rules.ok ? rules.value.minElevationDeg : LOWEST_DEG,
      recording: mode
        ? {
            bandwidthHz: mode.channelBandwidthHz * mode.channelsPerPolarisation * mode.polarisations,
            bits: mode.bits,
          }
        : null,
    }),
    overlaps: choices.taken.filter(
      (one) => typed.stations.includes(one.station) && one.startMs < endMs && startMs < one.endMs,
    ),
  };
}
