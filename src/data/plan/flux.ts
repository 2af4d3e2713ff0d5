import type { PlanSource } from '../../schedule/context';

/** A source's whole flux in a band; null where it is not known. */
export function fluxOf(
  { components }: Pick<PlanSource, 'components'>,
  band: string | undefined,
): number | null {
  const model = band === undefined ? undefined : components[band];
  return model ? model.reduce((sum, { fluxJy }) => sum + fluxJy, 0) : null;
}
