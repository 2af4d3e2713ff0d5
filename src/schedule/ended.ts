/**
 * Whether a session is over by word: closed or cancelled, so that nothing of it changes until it is opened again.
 *
 * @param state  of a session
 */
export const isEnded = (state: string): boolean => state === 'closed' || state === 'cancelled';
