/** The letter of a problem; "!" in lists where no letter has a place. */
export function FootnoteLetter({ letter = '!', mustFix }: { letter?: string; mustFix: boolean }) {
  return <i className={mustFix ? 'fn fn-must' : 'fn'}>{letter}</i>;
}
