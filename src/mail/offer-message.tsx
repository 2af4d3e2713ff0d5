import 'server-only';
import { Body, Button, Container, Head, Heading, Html, Preview, Text } from '@react-email/components';
import { render } from '@react-email/render';

export type OfferNotice = {
  kind: 'offer' | 'publish';
  sessionCode: string;
  title: string;
  number: number;
  stationCode: string;
  stationName: string;
  /** "2027-02-12 (043) 19:49:00 UT" */
  from: string;
  until: string;
  /** the same in the station's own time, with its zone */
  localFrom: string;
  localUntil: string;
  scans: number;
  mode: string;
  answerBy: string | null;
  note: string;
  link: string;
};

/** One message to a station's operators: what it means for them first, then the hours, one button. */
export async function offerMessage(
  notice: OfferNotice,
): Promise<{ subject: string; text: string; html: string }> {
  const page = <OfferMail {...notice} />;
  return { subject: subjectOf(notice), html: await render(page), text: plainText(notice) };
}

function subjectOf({ kind, sessionCode, number, stationCode }: OfferNotice): string {
  return kind === 'offer'
    ? `${sessionCode} offer ${number}: can ${stationCode} observe?`
    : `${sessionCode} version ${number}: the plan for ${stationCode} is published`;
}

const headingOf = ({ kind, stationName }: OfferNotice): string =>
  kind === 'offer' ? `A slot is offered to ${stationName}` : `The plan for ${stationName} is published`;

const firstLineOf = ({ kind, sessionCode, title, scans, from, until }: OfferNotice): string => {
  const asked = `${scans} ${scans === 1 ? 'scan' : 'scans'} of ${sessionCode} ${title}, from ${from} to ${until}`;
  return kind === 'offer' ? `You are asked for ${asked}.` : `Your part is ${asked}.`;
};

const answerLineOf = ({ kind, answerBy }: OfferNotice): string => {
  if (kind === 'publish') return 'Look whether your slot still stands as you confirmed it.';
  return answerBy === null
    ? 'Confirm the slot, confirm a part of it, or decline it with a reason.'
    : `Confirm the slot, confirm a part of it, or decline it with a reason. Answer by ${answerBy}.`;
};

const rowsOf = (notice: OfferNotice): [string, string][] => [
  ['Slot, UT', `${notice.from} to ${notice.until}`],
  ['Station time', `${notice.localFrom} to ${notice.localUntil}`],
  ['Scans', String(notice.scans)],
  ['Mode', notice.mode],
];

const footOf = ({ stationName }: OfferNotice): string =>
  `You get this because you are an operator at ${stationName}. Times are UT unless they name a zone.`;

function plainText(notice: OfferNotice): string {
  return [
    headingOf(notice),
    '',
    firstLineOf(notice),
    ...(notice.note === '' ? [] : ['', notice.note]),
    '',
    ...rowsOf(notice).map(([name, value]) => `${name}: ${value}`),
    '',
    answerLineOf(notice),
    notice.link,
    '',
    footOf(notice),
  ].join('\n');
}

const INK = '#1A2438';
const INK2 = '#454E60';
const SERIF = 'Georgia, serif';

function OfferMail(notice: OfferNotice) {
  return (
    <Html lang="en">
      <Head />
      <Preview>{firstLineOf(notice)}</Preview>
      <Body style={{ background: '#E9E4D8', fontFamily: 'Arial, sans-serif', margin: 0, padding: 20 }}>
        <Container
          style={{
            background: '#FFFFFF',
            borderTop: `6px solid ${INK}`,
            maxWidth: 620,
            padding: '18px 36px',
          }}
        >
          <Heading style={{ color: INK, font: `600 23px/30px ${SERIF}`, margin: '0 0 10px' }}>
            {headingOf(notice)}
          </Heading>
          <Line>{firstLineOf(notice)}</Line>
          {notice.note !== '' && <Line>{notice.note}</Line>}
          <table style={{ borderCollapse: 'collapse', color: INK, fontSize: 14, margin: '10px 0' }}>
            <tbody>
              {rowsOf(notice).map(([name, value]) => (
                <tr key={name}>
                  <th align="left" style={{ color: INK2, fontWeight: 400, padding: '6px 18px 6px 0' }}>
                    {name}
                  </th>
                  <td style={{ padding: '6px 0' }}>{value}</td>
                </tr>
              ))}
            </tbody>
          </table>
          <Button
            href={notice.link}
            style={{ background: INK, color: '#FFFFFF', fontWeight: 700, padding: '11px 22px' }}
          >
            {notice.kind === 'offer' ? 'Answer for the slot' : 'Open the slot'}
          </Button>
          <Line>{answerLineOf(notice)}</Line>
          <Text style={{ borderTop: '1px solid #DDD5C3', color: INK2, fontSize: 12.5, paddingTop: 8 }}>
            {footOf(notice)}
          </Text>
        </Container>
      </Body>
    </Html>
  );
}

const Line = ({ children }: { children: string }) => (
  <Text style={{ color: INK, fontSize: 15, lineHeight: '23px', margin: '10px 0' }}>{children}</Text>
);
