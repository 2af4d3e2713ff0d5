import type { SkySheet } from '@/src/data/sky/dto';
import type { Span } from './model';
import { spanTexts } from './words';

/** Windows in UT; a line breaks between them only. */
export function Spans({ spans, sheet }: { spans: readonly Span[]; sheet: Pick<SkySheet, 'session'> }) {
  if (spans.length === 0) return <span className="text-ink3">none</span>;
  return spanTexts(spans, sheet).map((text, index) => (
    <span key={text}>
      <span className="whitespace-nowrap">
        {text}
        {index < spans.length - 1 && ','}
      </span>{' '}
    </span>
  ));
}
