import type { ReactNode } from 'react';
import { wrongText } from './wrong';

/** Why something new was not kept: a refusal of the whole, and how many fields are wrong. */
export function NotKept({ refusal, wrong }: { refusal: ReactNode; wrong: number }) {
  return (
    <>
      {refusal !== null && (
        <div role="alert" className="error-box">
          {refusal}
        </div>
      )}
      {wrong > 0 && (
        <p role="status" className="error-box">
          {wrongText(wrong)} Nothing is kept yet.
        </p>
      )}
    </>
  );
}
