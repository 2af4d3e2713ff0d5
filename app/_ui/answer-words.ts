import type { Answer } from '@/src/schedule/slots';

/** A station's answer, as people read it. */
export const ANSWER_WORDS: Readonly<Record<Answer, string>> = {
  open: 'not answered',
  confirmed: 'confirmed',
  partly: 'partly',
  declined: 'declined',
  stale: 'ask again',
};
