import type { Answer } from '@/src/schedule/slots';
import { ANSWER_WORDS } from './answer-words';
import './answer-box.css';

/** A station's code with its answer by shape: filled, teal foot, dashed, dashed with a corner, struck. */
export function AnswerBox({ code, name, answer }: { code: string; name?: string; answer: Answer }) {
  const words = `${name ?? code}: ${ANSWER_WORDS[answer]}`;
  return (
    <span className={`ans ans-${answer}`} title={words}>
      {code}
      <span className="sr-only">, {ANSWER_WORDS[answer]}</span>
    </span>
  );
}
