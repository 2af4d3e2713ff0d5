import type { ReactNode } from 'react';

/** Names and values, one on a line. */
export function Pairs({ pairs }: { pairs: readonly (readonly [name: string, value: ReactNode])[] }) {
  return (
    <dl className="kv">
      {pairs.map(([name, value], index) => (
        <div key={index}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
