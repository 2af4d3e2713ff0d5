import { AnswerBox } from './answer-box';
import { ANSWER_WORDS } from './answer-words';

const ORDER = ['confirmed', 'partly', 'open', 'stale', 'declined'] as const;

/** The looks of the answers, each with its word. */
export function AnswerLegend({ code }: { code: string }) {
  return (
    <ul className="ans-legend" aria-label="Looks of the answers">
      {ORDER.map((answer) => (
        <li key={answer}>
          <AnswerBox code={code} answer={answer} /> {ANSWER_WORDS[answer]}
        </li>
      ))}
    </ul>
  );
}
