import type { ChangeDto } from '@/src/data/clock/dto';

export const CHANGE_WORDS: Readonly<Record<ChangeDto['kind'], string>> = {
  steered: 'Maser steered',
  resync: 'Formatter re-synchronised',
  cable: 'Cable changed',
  receiver: 'Receiver changed',
  power: 'Power cut',
  other: 'Something else',
};
